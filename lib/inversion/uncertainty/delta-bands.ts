import { carriersAt, profileValue } from '../profile/profile-value';
import type { PreparedFit } from '../fit/prepared-fit';
import { valuesOf } from '../fit/theta-of';
import { RESPONSES } from '../response/responses';
import type { FitAnswer, FitParameter, Interval, ParameterName } from '../types';
import { emptyBands, SIGMAS_68, SIGMAS_95, type Bands } from './bands';

/**
 * Bands from the intervals and correlations at the minimum, the instant preview of the bootstrap. Each free parameter is
 * moved to the end of its own interval and the change a_k of the value at each depth taken; the changes that raise the
 * value add up as √(Σ_kl s_k s_l ρ_kl a_k a_l), s_k the direction of the move; so do those that lower it. For small
 * intervals this is the delta method √(gᵀCg); moves of finite size keep the share between 0 and 1 and give a sharp edge a
 * band too.
 *
 * @returns null without a covariance.
 */
export function bandsByDelta(
  prepared: PreparedFit,
  answer: FitAnswer,
  depthsNm: ArrayLike<number>,
): Bands | null {
  const { covariance } = answer;
  if (!covariance.ok) return null;
  const free = answer.parameters.filter(
    ({ name, held }) => !held && name !== 'depthScale' && name !== 'levelCap',
  );
  const correlation = (a: ParameterName, b: ParameterName): number => {
    const k = covariance.names.indexOf(a);
    const l = covariance.names.indexOf(b);
    return a === b ? 1 : k < 0 || l < 0 ? 0 : covariance.correlation[k]![l]!;
  };
  const rho = free.map(({ name }) => free.map((other) => correlation(name, other.name)));
  const { response, polarity } = prepared.input;
  const carriers = carriersAt(prepared.input, valuesOf(answer));
  const ceiling =
    RESPONSES[response.kind].unit(response, carriers, polarity) === 'populated share'
      ? 1
      : Infinity;
  const bands = emptyBands('delta', depthsNm);
  const edges = (
    interval: 'interval68' | 'interval95',
    sigmas: number,
    lower: Float64Array,
    upper: Float64Array,
  ): void => {
    const values = valuesOf(answer);
    const centre = profileValue(prepared, values);
    const moved = free.map((parameter) =>
      endsOf(prepared, parameter, parameter[interval], sigmas).map((value) =>
        profileValue(prepared, { ...values, [parameter.name]: value }),
      ),
    );
    for (let k = 0; k < depthsNm.length; k++) {
      const depth = depthsNm[k]!;
      const value = centre(depth);
      const changes = moved.map((ends) => ends.map((end) => end(depth) - value));
      lower[k] = Math.max(0, value - spread(changes, rho, -1));
      upper[k] = Math.min(ceiling, value + spread(changes, rho, 1));
    }
  };
  edges('interval68', SIGMAS_68, bands.lower68, bands.upper68);
  edges('interval95', SIGMAS_95, bands.lower95, bands.upper95);
  // Intervals of curved problems need not nest in the direction that counts here; bands do.
  for (let k = 0; k < depthsNm.length; k++) {
    bands.lower95[k] = Math.min(bands.lower95[k]!, bands.lower68[k]!);
    bands.upper95[k] = Math.max(bands.upper95[k]!, bands.upper68[k]!);
  }
  return bands;
}

/** Ends of an interval; an open end is where the linear error bar puts it, or the bound without one. */
function endsOf(
  { problem }: PreparedFit,
  { name, value, sigma }: FitParameter,
  [lower, upper]: Interval,
  sigmas: number,
): [number, number] {
  const { model } = problem;
  const k = model.names.indexOf(name);
  const reach = sigma === null ? Infinity : sigmas * sigma;
  const end = (to: number, bound: number): number =>
    Number.isFinite(to) ? to : Number.isFinite(bound) ? bound : value;
  return [
    lower ?? end(Math.max(model.lower[k]!, value - reach), model.lower[k]!),
    upper ?? end(Math.min(model.upper[k]!, value + reach), model.upper[k]!),
  ];
}

/** How far the value moves in one direction: `changes` holds, per parameter, the change at the lower and the upper end. */
function spread(
  changes: readonly (readonly number[])[],
  rho: readonly (readonly number[])[],
  direction: 1 | -1,
): number {
  const moves = changes.map(([atLower, atUpper]) => {
    const down = Math.max(0, direction * atLower!);
    const up = Math.max(0, direction * atUpper!);
    return up >= down ? up : -down;
  });
  let variance = 0;
  for (let a = 0; a < moves.length; a++) {
    for (let b = 0; b < moves.length; b++) variance += rho[a]![b]! * moves[a]! * moves[b]!;
  }
  return Math.sqrt(Math.max(0, variance));
}
