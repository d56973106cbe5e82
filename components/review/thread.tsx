import { Moment } from '@/components/ui/moment';
import { TextLink } from '@/components/ui/text-link';
import type { ReviewEvent } from '@/lib/schemas/fit';

import { checkName, targetAnchor } from './comment-targets';

const DEEDS: Record<ReviewEvent['kind'], string> = {
  submitted: 'sent it to review',
  accepted: 'accepted it',
  returned: 'returned it',
  comment: 'commented',
};

/** Events and comments of a fit, oldest first. */
export function Thread({ events }: { events: readonly ReviewEvent[] }) {
  if (events.length === 0) {
    return <p className="text-sm text-ink-3">Nothing has been said about this fit yet.</p>;
  }
  return (
    <ol className="grid">
      {events.map((event) => (
        <li
          key={event.id}
          className={`grid gap-1 border-l-2 py-2 pl-4 ${event.kind === 'comment' ? 'border-rule' : 'border-ink-2'}`}
        >
          <p className="text-sm text-ink-2">
            <strong className="font-semibold text-ink">{event.person}</strong> {DEEDS[event.kind]}
            <Target value={event.target} />, <Moment at={event.at} />
          </p>
          {event.body !== '' && <p className="prose-measure whitespace-pre-line">{event.body}</p>}
        </li>
      ))}
    </ol>
  );
}

function Target({ value }: { value: string }) {
  if (value === '') return null;
  const anchor = targetAnchor(value);
  const words = value.startsWith('check ')
    ? `the check “${checkName(value.slice('check '.length))}”`
    : value;
  return <> on {anchor ? <TextLink href={anchor}>{words}</TextLink> : words}</>;
}
