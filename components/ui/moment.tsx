'use client';

import { useSyncExternalStore } from 'react';

type MomentProps = {
  /** ISO 8601, UTC. */
  at: string;
  /** Date only. */
  dateOnly?: boolean;
  className?: string;
};

const nothingToWatch = () => () => {};

/** A moment in the reader's own zone. The server does not know that zone and says UTC until the page is live. */
export function Moment({ at, dateOnly = false, className }: MomentProps) {
  const live = useSyncExternalStore(
    nothingToWatch,
    () => true,
    () => false,
  );
  const timeZone = live ? undefined : 'UTC';
  const words = new Intl.DateTimeFormat('en-GB', {
    dateStyle: 'medium',
    timeStyle: dateOnly ? undefined : 'short',
    timeZone,
  }).format(new Date(at));
  return (
    <time
      dateTime={at}
      title={`${at.replace('T', ' ').replace(/(\.\d+)?Z$/, '')} UTC`}
      className={className}
    >
      {words}
      {!live && !dateOnly && ' UTC'}
    </time>
  );
}
