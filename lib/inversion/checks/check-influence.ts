import { meanLevel } from '../fit/evaluate';
import { whitenedValues, whitenerOf } from '../fit/scan-rows';
import { whiten } from '../linalg/whitener';
import { minimise } from '../fit/minimise';
import type { Problem } from '../fit/model';
import { openWidths } from '../fit/widths';
import { thetaOf, valuesOf } from '../fit/theta-of';
import { figure, locatorOf, locatorWords, type CheckContext, type FitCheck } from './check-context';

const OPTIONS = { maxIterations: 40, tolerance: 1e-6 };

/** Leave-one-out: how far the edge, or the band bending, moves when any one point is switched off, in its standard deviations. */
export const checkInfluence: FitCheck = (context) => {
  const { prepared } = context;
  const edge = locatorOf(context);
  const { what, unit } = locatorWords(edge);
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
  const { energyKeV, moved } = mostInfluential(context, edge.value);
  const shift = Math.abs(moved - edge.value) / sigma;
  const seen = `without the point at ${figure(energyKeV)} keV the ${what} moves to ${figure(moved)} ${unit}, ${figure(shift)} of its standard deviations`;
  if (shift > 3) return { id, state: 'problem', message: `One point carries the result: ${seen}.` };
  if (shift > 1.5) return { id, state: 'caution', message: `One point matters a lot: ${seen}.` };
  return { id, state: 'fine', message: `No single point carries the result: ${seen} at most.` };
};

function mostInfluential(
  { prepared, answer }: CheckContext,
  value: number,
): { energyKeV: number; moved: number } {
  const { problem, scratch, input } = prepared;
  const { model } = problem;
  const best = thetaOf(prepared, valuesOf(answer));
  const theta = new Float64Array(model.size);
  let worst = { energyKeV: input.points[model.pointOfRow[0]!]!.energyKeV, moved: value };
  for (let row = 0; row < model.rowCount; row++) {
    if (model.whitener.inverseSigma[row] === 0) continue;
    theta.set(best);
    openWidths(model, theta, model.held);
    minimise(withoutRow(prepared, row), theta, model.held, scratch, OPTIONS);
    if (Math.abs(theta[0]! - value) > Math.abs(worst.moved - value))
      worst = { energyKeV: input.points[model.pointOfRow[row]!]!.energyKeV, moved: theta[0]! };
  }
  return worst;
}

function withoutRow({ problem, input }: CheckContext['prepared'], row: number): Problem {
  const { model, data, work } = problem;
  const left = model.pointOfRow[row]!;
  const points = input.points.map((point, index) =>
    index === left ? { ...point, enabled: false } : point,
  );
  const whitener = whitenerOf({ ...input, points }, model.pointOfRow);
  const unit = new Float64Array(model.rowCount).fill(1);
  whiten(whitener, unit);
  const rest = { ...model, whitener, unit };
  const target = whitenedValues({ points }, model.pointOfRow, whitener);
  const without = { target, priorMean: data.priorMean };
  return { model: rest, data: without, work, fallback: meanLevel(rest, without) };
}
