import { DataTable } from '@/components/ui/data-table';
import { asEntered, significant } from '@/lib/format';
import type { Fit } from '@/lib/schemas/fit';

import { PARAMETER_ORDER, parameterLabel, parameterUnit } from './parameter-words';
import { ParameterFigure } from './parameter-figure';

type FitParameter = Fit['answer']['parameters'][number];

/** Every parameter with its intervals, and what was assumed of it: free, held or prior, with the origin. */
export function ParameterTable({ fit }: { fit: Fit }) {
  const rows = PARAMETER_ORDER.flatMap(
    (name) => fit.answer.parameters.find((parameter) => parameter.name === name) ?? [],
  );
  return (
    <DataTable
      caption="Parameters"
      captionHidden
      stacks
      rows={rows}
      rowKey={(row) => row.name}
      columns={[
        {
          key: 'name',
          label: 'parameter',
          rowHeader: true,
          cell: (row) => parameterLabel(row.name, fit),
        },
        {
          key: 'value',
          label: 'value, 68 %',
          cell: (row) => (
            <ParameterFigure parameter={row} unit={parameterUnit(row.name, fit.observable)} />
          ),
        },
        {
          key: 'i95',
          label: '95 %',
          cell: (row) => <span className="figures sm:whitespace-nowrap">{intervalWords(row)}</span>,
        },
        { key: 'assumed', label: 'assumed', cell: (row) => assumedWords(row, fit) },
      ]}
    />
  );
}

function intervalWords({ held, interval95: [low, high] }: FitParameter): string {
  if (held) return '–';
  if (low === null && high === null) return 'open on both sides';
  return `${low === null ? 'open' : significant(low)} to ${high === null ? 'open' : significant(high)}`;
}

/** "free", "held (bulk run)", "prior 0.32 ± 0.02 (bulk run)", and whether a bound was met. */
function assumedWords(row: FitParameter, fit: Fit): string {
  const setting = fit.spec.parameters[row.name];
  const origin = setting && setting.origin !== '' ? ` (${setting.origin})` : '';
  const bound = row.atBound === null ? '' : `, at its ${row.atBound} bound`;
  if (row.held) return `held${origin}`;
  if (!setting?.prior) return `free${bound}`;
  const { mean, sigma } = setting.prior;
  return `prior ${asEntered(mean)} ± ${asEntered(sigma)}${origin}${bound}`;
}
