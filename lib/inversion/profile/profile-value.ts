import type { PreparedFit } from '../fit/prepared-fit';
import { RESPONSES } from '../response/responses';
import type { ParameterValues } from '../types';

/** p(x) in cm⁻³, or the populated share, as a function of the depth below the cap (nm) at the values of a fit. */
export function profileValue(
  { input, problem }: PreparedFit,
  values: ParameterValues,
): (depthNm: number) => number {
  const { trial } = problem.model;
  const shape = trial.shapeNames.map((name) => values[name]!);
  const { offset, slope } = RESPONSES[input.response.kind].line(
    values.levelTop!,
    values.levelBulk!,
    input,
  );
  return (depthNm) => offset + slope * trial.share(depthNm, shape);
}
