'use client';

import { DataTable } from '@/components/ui/data-table';
import { significant, withDecimals } from '@/lib/format';
import type { StoppingMoments } from '@/lib/inversion/index';

export interface MomentsRow extends StoppingMoments {
  energyKeV: number;
  bins: number;
  lostShare: number | null;
}

interface MomentsTableProps {
  rows: readonly MomentsRow[];
  /** An energy is pointed at, or no longer. */
  onLight: (energyKeV: number | null) => void;
}

/** Mean, straggling and quantiles of each stopping profile. */
export function MomentsTable({ rows, onLight }: MomentsTableProps) {
  const nm = (value: number) => <span title={String(value)}>{withDecimals(value, 1)}</span>;
  return (
    <DataTable
      dense
      caption="Moments"
      className="relative max-h-[36rem] overflow-y-auto"
      rows={rows}
      rowKey={({ energyKeV }) => energyKeV}
      columns={[
        {
          key: 'energy',
          label: 'energy (keV)',
          rowHeader: true,
          cell: ({ energyKeV }) => (
            <button
              type="button"
              className="-my-1 px-1 py-1 figures hover:text-coral-ink"
              aria-label={`${energyKeV} keV: light its profile`}
              onPointerEnter={() => onLight(energyKeV)}
              onPointerLeave={() => onLight(null)}
              onFocus={() => onLight(energyKeV)}
              onBlur={() => onLight(null)}
            >
              {energyKeV}
            </button>
          ),
        },
        { key: 'mean', label: 'mean (nm)', numeric: true, cell: ({ meanNm }) => nm(meanNm) },
        {
          key: 'straggle',
          label: 'straggling (nm)',
          numeric: true,
          cell: ({ straggleNm }) => nm(straggleNm),
        },
        {
          key: 'median',
          label: 'median (nm)',
          numeric: true,
          cell: ({ medianNm }) => nm(medianNm),
        },
        {
          key: 'low',
          label: '5 % (nm)',
          numeric: true,
          cell: ({ quantile05Nm }) => nm(quantile05Nm),
        },
        {
          key: 'high',
          label: '95 % (nm)',
          numeric: true,
          cell: ({ quantile95Nm }) => nm(quantile95Nm),
        },
        {
          key: 'lost',
          label: 'not stopped',
          numeric: true,
          cell: ({ lostShare }) => lostWords(lostShare),
        },
        {
          key: 'bins',
          label: 'bins',
          numeric: true,
          cell: ({ bins }) => bins.toLocaleString('en'),
        },
      ]}
    />
  );
}

function lostWords(lostShare: number | null): string {
  if (lostShare === null) return 'not given';
  return lostShare === 0 ? '0 %' : `${significant(lostShare * 100, 2)} %`;
}
