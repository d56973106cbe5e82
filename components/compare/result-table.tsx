import { ParameterFigure } from '@/components/review/parameter-figure';
import { PARAMETER_ORDER, parameterUnit } from '@/components/review/parameter-words';
import { DataTable } from '@/components/ui/data-table';
import { Mark } from '@/components/ui/mark';
import type { Fit } from '@/lib/schemas/fit';

import { settingLabel } from './assumptions';
import { parameterOf, resultDisagreements, type ResultDisagreement } from './disagreements';
import type { FitMark } from './fit-mark';

interface ResultRow {
  name: (typeof PARAMETER_ORDER)[number];
  /** One place per fit; a fit without this parameter leaves its place empty. */
  parameters: ReturnType<typeof parameterOf>[];
  apart: ResultDisagreement[];
}

/** Every fitted value beside its fellows, and in words where intervals do not meet. */
export function ResultTable({ fits, marks }: { fits: readonly Fit[]; marks: readonly FitMark[] }) {
  const disagreements = resultDisagreements(fits);
  const rows = PARAMETER_ORDER.map((name): ResultRow => ({
    name,
    parameters: fits.map((fit) => parameterOf(fit, name)),
    apart: disagreements.filter((one) => one.name === name),
  })).filter((row) => row.parameters.some((parameter) => parameter !== undefined));
  const observable = fits[0]?.observable ?? 'fraction';
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
          cell: (row: ResultRow) => (
            <ParameterFigure
              parameter={row.parameters[index]}
              unit={parameterUnit(row.name, observable)}
            />
          ),
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
  const there = row.parameters.filter((parameter) => parameter !== undefined);
  if (there.length < 2) return <span className="text-ink-3">only in one fit</span>;
  if (there.every((parameter) => parameter.held)) {
    return <span className="text-ink-3">held, by choice</span>;
  }
  if (row.apart.length === 0) {
    return (
      <span className="flex gap-1.5">
        <Mark kind="fine" className="mt-0.5" /> yes, 68 % intervals meet
      </span>
    );
  }
  return (
    <ul className="grid gap-0.5">
      {row.apart.map(({ first, second, verdict }) => (
        <li key={`${first}-${second}`} className="flex gap-1.5">
          <Mark kind={verdict === 'beyond 95 %' ? 'problem' : 'caution'} className="mt-0.5" />
          <span>
            no: the {verdict === 'beyond 95 %' ? '95 %' : '68 %'} intervals of{' '}
            {marks[first]?.letter} and {marks[second]?.letter} do not meet
          </span>
        </li>
      ))}
    </ul>
  );
}
