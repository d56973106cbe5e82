import { meanLevel } from '../fit/evaluate';
import { minimise } from '../fit/minimise';
import type { Problem } from '../fit/model';
import { openWidths } from '../fit/widths';
import { thetaOf, valuesOf } from '../fit/theta-of';
import { figure, parameterOf, type CheckContext, type FitCheck } from './check-context';

const OPTIONS = { maxIterations: 40, tolerance: 1e-6 };

/** Leave-one-out: how far the edge moves when any one point is switched off, in its standard deviations. */
export const checkInfluence: FitCheck = (context) => {
  const { prepared } = context;
  const edge = parameterOf(context, 'edgeDepthNm')!;
  const id = 'leave-one-out';
  if (edge.held) return null;
  if (prepared.enabledCount + prepared.priorCount - 1 < prepared.freeNames.length) {
    return {
      id,
      state: 'caution',
      message:
        'Every point is needed: without any one of them the fit has fewer points than parameters.',
    };
  }
  const [lower, upper] = edge.interval68;
  const sigma = edge.sigma ?? (lower !== null && upper !== null ? (upper - lower) / 2 : null);
  if (sigma === null || !(sigma > 0)) return null;
  const { energyKeV, edgeNm } = mostInfluential(context, edge.value);
  const shift = Math.abs(edgeNm - edge.value) / sigma;
  const seen = `without the point at ${figure(energyKeV)} keV the edge moves to ${figure(edgeNm)} nm, ${figure(shift)} of its standard deviations`;
  if (shift > 3) return { id, state: 'problem', message: `One point carries the result: ${seen}.` };
  if (shift > 1.5) return { id, state: 'caution', message: `One point matters a lot: ${seen}.` };
  return { id, state: 'fine', message: `No single point carries the result: ${seen} at most.` };
};

function mostInfluential(
  { prepared, answer }: CheckContext,
  edgeNm: number,
): { energyKeV: number; edgeNm: number } {
  const { problem, scratch, input } = prepared;
  const { model } = problem;
  const inverseSigma = Float64Array.from(problem.data.inverseSigma);
  const without: Problem = { ...problem, data: { ...problem.data, inverseSigma } };
  const best = thetaOf(prepared, valuesOf(answer));
  const theta = new Float64Array(model.size);
  let worst = { energyKeV: input.points[model.pointOfRow[0]!]!.energyKeV, edgeNm };
  for (let row = 0; row < model.rowCount; row++) {
    const kept = inverseSigma[row]!;
    if (kept === 0) continue;
    inverseSigma[row] = 0;
    without.fallback = meanLevel(without.data);
    theta.set(best);
    openWidths(model, theta, model.held);
    minimise(without, theta, model.held, scratch, OPTIONS);
    inverseSigma[row] = kept;
    if (Math.abs(theta[0]! - edgeNm) > Math.abs(worst.edgeNm - edgeNm)) {
      worst = { energyKeV: input.points[model.pointOfRow[row]!]!.energyKeV, edgeNm: theta[0]! };
    }
  }
  return worst;
}
