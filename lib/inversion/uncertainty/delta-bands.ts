import type { PreparedFit } from '../fit/prepared-fit';
import { valuesOf } from '../fit/theta-of';
import { RESPONSES } from '../response/responses';
import type { Covariance, FitAnswer, ParameterName } from '../types';
import { emptyBands, SIGMAS_68, SIGMAS_95, type Bands } from './bands';

/**
 * Bands from the covariance (delta method), the instant preview of the bootstrap. The edge is propagated on the argument of
 * s, (x − W)/w, so that the share stays between 0 and 1 and a sharp edge gets a band too; the levels, where the profile
 * follows them, are propagated linearly; both are added with their correlation.
 *
 * @returns null without a covariance.
 */
export function bandsByDelta(
  { input, problem }: PreparedFit,
  answer: FitAnswer,
  depthsNm: ArrayLike<number>,
): Bands | null {
  const { covariance } = answer;
  if (!covariance.ok) return null;
  const { trial } = problem.model;
  const values = valuesOf(answer);
  const shape = trial.shapeNames.map((name) => values[name]!);
  const response = RESPONSES[input.response.kind];
  const { offset, slope } = response.line(values.levelTop!, values.levelBulk!, input);
  const perLevel = response.followsLevels ? slope / (values.levelBulk! - values.levelTop!) : 0;
  const c = covarianceBlock(covariance, [...trial.shapeNames, 'levelTop', 'levelBulk']);
  const shapeCovariance = trial.shapeNames.map((_, a) => c[a]!.slice(0, trial.shapeNames.length));
  const direction: number[] = [];
  const bands = emptyBands('delta', depthsNm);
  const ceiling =
    response.unit(input.response, input.carriers, input.polarity) === 'populated share'
      ? 1
      : Infinity;
  for (let k = 0; k < depthsNm.length; k++) {
    const depth = depthsNm[k]!;
    const share = trial.share(depth, shape);
    const value = offset + slope * share;
    trial.shiftDirection(depth, shape, direction);
    const levels = Number.isFinite(perLevel)
      ? levelPart(c, trial.shapeNames.length, direction, share, perLevel)
      : { sigma: 0, correlation: 0 };
    const side = (sigmas: number): number => {
      const edgePart = slope * (trial.shiftedShare(depth, shape, shapeCovariance, sigmas) - share);
      const levelShift = Math.abs(sigmas) * levels.sigma;
      const cross =
        2 *
        levels.correlation *
        Math.sign(slope * sigmas) *
        Math.sign(edgePart) *
        edgePart *
        levelShift;
      const width = Math.sqrt(
        Math.max(
          0,
          edgePart * edgePart +
            levelShift * levelShift +
            Math.abs(cross) * Math.sign(levels.correlation * slope),
        ),
      );
      return Math.sign(slope || 1) * Math.sign(sigmas) * width;
    };
    const clamp = (x: number): number => Math.min(ceiling, Math.max(0, x));
    const ends68 = [value + side(-SIGMAS_68), value + side(SIGMAS_68)];
    const ends95 = [value + side(-SIGMAS_95), value + side(SIGMAS_95)];
    bands.lower68[k] = clamp(Math.min(...ends68));
    bands.upper68[k] = clamp(Math.max(...ends68));
    bands.lower95[k] = clamp(Math.min(...ends95));
    bands.upper95[k] = clamp(Math.max(...ends95));
  }
  return bands;
}

/** Standard deviation of the level part of the value, and its correlation with the argument of s. */
function levelPart(
  c: number[][],
  shapeCount: number,
  direction: number[],
  share: number,
  perLevel: number,
): { sigma: number; correlation: number } {
  const weights = [(1 - share) * perLevel, share * perLevel];
  let variance = 0;
  let cross = 0;
  let shift = 0;
  for (let a = 0; a < 2; a++) {
    for (let b = 0; b < 2; b++)
      variance += weights[a]! * weights[b]! * c[shapeCount + a]![shapeCount + b]!;
    for (let k = 0; k < shapeCount; k++)
      cross += weights[a]! * direction[k]! * c[k]![shapeCount + a]!;
  }
  for (let k = 0; k < shapeCount; k++)
    for (let l = 0; l < shapeCount; l++) shift += direction[k]! * direction[l]! * c[k]![l]!;
  return {
    sigma: Math.sqrt(Math.max(0, variance)),
    correlation: variance > 0 && shift > 0 ? cross / Math.sqrt(variance * shift) : 0,
  };
}

/** Covariance among the named parameters; 0 for what is held or at a bound. */
function covarianceBlock(
  covariance: Extract<Covariance, { ok: true }>,
  wanted: readonly ParameterName[],
): number[][] {
  const at = wanted.map((name) => covariance.names.indexOf(name));
  return at.map((k) => at.map((l) => (k < 0 || l < 0 ? 0 : covariance.matrix[k]![l]!)));
}
