import { DataTable } from '@/components/ui/data-table';
import { formatProbability, withDecimals } from '@/lib/format';

import type { FitMark } from './fit-mark';
import { MarkSample } from './mark-sample';

export interface CompareEvidenceRow {
  mark: FitMark;
  name: string;
  chiSquare: number;
  freeParameters: number;
  degreesOfFreedom: number;
  pValue: number | null;
  aicc: number | null;
  deltaAicc: number | null;
  weight: number | null;
  bic: number;
}

const figure = (value: number | null, decimals: number) =>
  value === null ? (
    <span title="Too few points for this number">–</span>
  ) : (
    <span title={String(value)}>{withDecimals(value, decimals)}</span>
  );

/** χ² and what penalises it, fit by fit. `weighed` is off where the fits do not share their points. */
export function CompareEvidence({
  rows,
  weighed,
}: {
  rows: readonly CompareEvidenceRow[];
  weighed: boolean;
}) {
  return (
    <DataTable
      caption="Evidence"
      captionHidden
      rows={rows}
      rowKey={(row) => row.mark.letter}
      columns={[
        {
          key: 'fit',
          label: 'fit',
          rowHeader: true,
          cell: (row) => (
            <span className="flex items-center gap-2">
              <MarkSample mark={row.mark} />
              {row.name}
            </span>
          ),
        },
        { key: 'chi', label: 'χ²', numeric: true, cell: (row) => figure(row.chiSquare, 2) },
        { key: 'k', label: 'k', numeric: true, cell: (row) => row.freeParameters },
        {
          key: 'df',
          label: 'degrees of freedom',
          numeric: true,
          cell: (row) => row.degreesOfFreedom,
        },
        {
          key: 'p',
          label: 'p',
          numeric: true,
          cell: (row) => (row.pValue === null ? '–' : formatProbability(row.pValue)),
        },
        { key: 'aicc', label: 'AICc', numeric: true, cell: (row) => figure(row.aicc, 2) },
        ...(weighed
          ? [
              {
                key: 'delta',
                label: 'ΔAICc',
                numeric: true,
                cell: (row: CompareEvidenceRow) => figure(row.deltaAicc, 2),
              },
              {
                key: 'weight',
                label: 'weight',
                numeric: true,
                cell: (row: CompareEvidenceRow) => figure(row.weight, 2),
              },
            ]
          : []),
        { key: 'bic', label: 'BIC', numeric: true, cell: (row) => figure(row.bic, 2) },
      ]}
    />
  );
}
