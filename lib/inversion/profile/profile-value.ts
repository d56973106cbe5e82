import type { PreparedFit } from '../fit/prepared-fit';
import { RESPONSES } from '../response/responses';
import type { CarrierScale, FitInput, ParameterValues } from '../types';

/** Concentrations on both sides of a profile. Bent bands bring their own bulk, and none are left where s = 0. */
export function carriersAt({ carriers }: FitInput, { bulkPerCm3 }: ParameterValues): CarrierScale {
  return bulkPerCm3 === undefined ? carriers : { ...carriers, bulkPerCm3, topPerCm3: 0 };
}

/** p(x) in cm⁻³, or the populated share, as a function of the depth below the cap (nm) at the values of a fit. */
export function profileValue(
  { input, problem }: PreparedFit,
  values: ParameterValues,
): (depthNm: number) => number {
  const { trial } = problem.model;
  const shape = trial.shape.map(({ name }) => values[name]!);
  const { offset, slope } = RESPONSES[input.response.kind].line(
    values.levelTop!,
    values.levelBulk!,
    { ...input, carriers: carriersAt(input, values) },
  );
  return (depthNm) => offset + slope * trial.share(depthNm, shape);
}
