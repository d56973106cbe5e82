import { DataTable } from '@/components/ui/data-table';
import { InventedMark } from '@/components/ui/invented-mark';
import { TextLink } from '@/components/ui/text-link';
import type { Fit } from '@/lib/schemas/fit';

import { checkSummary } from './check-list';
import { ParameterFigure } from './parameter-figure';
import { waitingWords } from './waiting-words';

/** Fits that wait for a decision, the longest first. One's own are listed, and said to be someone else's to review. */
export function ReviewQueue({
  fits,
  viewerId,
  now,
}: {
  fits: readonly Fit[];
  viewerId: string;
  now: Date;
}) {
  return (
    <DataTable
      caption="Fits in review"
      captionHidden
      stacks
      rows={fits}
      rowKey={(fit) => fit.id}
      columns={[
        {
          key: 'fit',
          label: 'fit',
          rowHeader: true,
          cell: (fit) => (
            <span className="flex flex-wrap items-center gap-2">
              <TextLink href={`/reviews/${fit.id}`}>{fit.name}</TextLink>
              {fit.invented && <InventedMark />}
            </span>
          ),
        },
        {
          key: 'sample',
          label: 'sample, scan',
          cell: (fit) => `${fit.sampleName}, ${fit.scanName}`,
        },
        { key: 'profile', label: 'profile', cell: (fit) => `${fit.profile} edge` },
        {
          key: 'edge',
          label: 'edge',
          cell: (fit) => <ParameterFigure parameter={fit.edge} unit="nm" />,
        },
        { key: 'checks', label: 'checks', cell: (fit) => checkSummary(fit.checks) },
        {
          key: 'by',
          label: 'by',
          cell: (fit) =>
            fit.createdById === viewerId ? 'yours: someone else must review' : fit.createdBy,
        },
        {
          key: 'waits',
          label: 'has waited',
          cell: (fit) => waitingWords(submittedAt(fit), now),
        },
      ]}
    />
  );
}

/** When the fit was last sent to review. */
export function submittedAt(fit: Pick<Fit, 'events' | 'createdAt'>): string {
  const sent = fit.events.filter((event) => event.kind === 'submitted').map((event) => event.at);
  return sent.at(-1) ?? fit.createdAt;
}
