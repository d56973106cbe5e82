import { Num } from '@/components/ui/num';
import type { FitRow } from '@/lib/schemas/fit';

import { parameterText } from './parameter-value';

/** A fitted value in a column of figures; all its digits on hover. */
export function ParameterFigure({
  parameter,
  unit,
}: {
  parameter: FitRow['edge'] | undefined;
  unit: string;
}) {
  if (!parameter) return <span className="text-ink-3">–</span>;
  const full = [String(parameter.value), unit].filter(Boolean).join(' ');
  return (
    <Num title={full} className="whitespace-normal sm:whitespace-nowrap">
      {parameterText(parameter, unit)}
    </Num>
  );
}
