import { DataTable } from '@/components/ui/data-table';

import type { AssumptionRow } from './assumptions';
import type { FitMark } from './fit-mark';

/** Where the fits assume different things; what they share can be unfolded. */
export function AssumptionTable({
  rows,
  marks,
}: {
  rows: readonly AssumptionRow[];
  marks: readonly FitMark[];
}) {
  const differing = rows.filter((row) => row.differs);
  const shared = rows.filter((row) => !row.differs);
  return (
    <div className="grid gap-3">
      {differing.length === 0 ? (
        <p className="text-sm text-ink-2">These fits assume the same in everything.</p>
      ) : (
        <DataTable
          caption="Different assumptions"
          captionHidden
          stacks
          rows={differing}
          rowKey={(row) => row.label}
          columns={[
            { key: 'label', label: 'assumption', rowHeader: true, cell: (row) => row.label },
            ...marks.map((mark, index) => ({
              key: mark.letter,
              label: mark.letter,
              cell: (row: AssumptionRow) => row.values[index],
            })),
          ]}
        />
      )}
      {shared.length > 0 && (
        <details className="text-sm">
          <summary className="w-fit text-ink-2">What they share ({shared.length})</summary>
          <dl className="mt-2 grid gap-x-6 gap-y-1 sm:grid-cols-[max-content_1fr]">
            {shared.map((row) => (
              <div key={row.label} className="contents">
                <dt className="text-ink-3">{row.label}</dt>
                <dd>{row.values[0]}</dd>
              </div>
            ))}
          </dl>
        </details>
      )}
    </div>
  );
}
