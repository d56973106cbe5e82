import { PARAMETER_ORDER, parameterUnit } from '@/components/review/parameter-words';
import { parameterText } from '@/components/review/parameter-value';
import { DataTable } from '@/components/ui/data-table';
import { Mark } from '@/components/ui/mark';
import type { Fit } from '@/lib/schemas/fit';

import { settingLabel } from './assumptions';
import { parameterOf, resultDisagreements, type ResultDisagreement } from './disagreements';
import type { FitMark } from './fit-mark';

interface ResultRow {
  name: (typeof PARAMETER_ORDER)[number];
  values: string[];
  apart: ResultDisagreement[];
}

/** Every fitted value beside its fellows, and in words where intervals do not meet. */
export function ResultTable({ fits, marks }: { fits: readonly Fit[]; marks: readonly FitMark[] }) {
  const disagreements = resultDisagreements(fits);
  const rows = PARAMETER_ORDER.map((name): ResultRow => ({
    name,
    values: fits.map((fit) => {
      const parameter = parameterOf(fit, name);
      return parameter ? parameterText(parameter, parameterUnit(name, fit.observable)) : '–';
    }),
    apart: disagreements.filter((one) => one.name === name),
  })).filter((row) => row.values.some((value) => value !== '–'));
  return (
    <DataTable
      caption="Results and where they disagree"
      captionHidden
      stacks
      rows={rows}
      rowKey={(row) => row.name}
      columns={[
        { key: 'label', label: 'result', rowHeader: true, cell: (row) => settingLabel(row.name) },
        ...marks.map((mark, index) => ({
          key: mark.letter,
          label: mark.letter,
          className: 'figures',
          cell: (row: ResultRow) => row.values[index],
        })),
        {
          key: 'verdict',
          label: 'do they agree?',
          cell: (row) => <VerdictWords row={row} marks={marks} />,
        },
      ]}
    />
  );
}

function VerdictWords({ row, marks }: { row: ResultRow; marks: readonly FitMark[] }) {
  const comparedCount = row.values.filter((value) => value !== '–').length;
  if (comparedCount < 2) return <span className="text-ink-3">only in one fit</span>;
  if (row.values.every((value) => value.endsWith('(held)'))) {
    return <span className="text-ink-3">held in all</span>;
  }
  if (row.apart.length === 0) {
    return (
      <span className="inline-flex gap-1.5">
        <Mark kind="fine" className="mt-0.5" /> yes, 68 % intervals meet
      </span>
    );
  }
  return (
    <ul className="grid gap-0.5">
      {row.apart.map(({ first, second, verdict }) => (
        <li key={`${first}-${second}`} className="flex gap-1.5">
          <Mark kind={verdict === 'beyond 95 %' ? 'problem' : 'caution'} className="mt-0.5" />
          {marks[first]?.letter} and {marks[second]?.letter}: the{' '}
          {verdict === 'beyond 95 %' ? '95 %' : '68 %'} intervals do not meet
        </li>
      ))}
    </ul>
  );
}
