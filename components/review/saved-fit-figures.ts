import type { DepthInformation, Ridge } from '@/components/charts/chart-types';
import {
  depthInformation,
  foldCurve,
  prepareFit,
  stoppingProfileAt,
  valuesOf,
  type FitInput,
  type PreparedFit,
} from '@/lib/inversion/index';
import type { Fit } from '@/lib/schemas/fit';
import type { StoppingSetAnswer } from '@/lib/schemas/stopping-set';

import { fitInputOf } from './fit-input-of';
import { thinRidge } from './thin-ridge';

const CURVE_POINTS = 80;
const MOST_RIDGE_BINS = 200;
const INFORMATION_POINTS = 120;

/** What the figures of a saved fit show besides the numbers that were saved with it; plain arrays that travel to the browser. */
export interface SavedFitFigures {
  curve: { energiesKeV: number[]; values: number[] };
  information: DepthInformation;
  ridges: Ridge[];
}

/** Folds a saved fit again over a smooth range of energies, with its frozen parameters. */
export function savedCurve(fit: Fit, set: StoppingSetAnswer): SavedFitFigures['curve'] {
  const input = fitInputOf(fit, set);
  return curveOf(fit, input, prepareFit(input));
}

export function savedFitFigures(fit: Fit, set: StoppingSetAnswer): SavedFitFigures {
  const input = fitInputOf(fit, set);
  const prepared = prepareFit(input);
  const deepest = fit.carrierProfile.points.at(-1)?.depthNm ?? fit.carrierProfile.reachNm;
  const depthsNm = evenly(0, deepest, INFORMATION_POINTS);
  return {
    curve: curveOf(fit, input, prepared),
    information: { depthsNm, values: Array.from(depthInformation(prepared, fit.answer, depthsNm)) },
    ridges: input.points
      .filter((point) => point.enabled)
      .map(({ energyKeV }) => {
        const profile = stoppingProfileAt(input.stopping, energyKeV);
        return thinRidge(
          { ...profile, interpolated: profile.interpolatedBetween !== null },
          MOST_RIDGE_BINS,
        );
      }),
  };
}

function curveOf(fit: Fit, input: FitInput, prepared: PreparedFit): SavedFitFigures['curve'] {
  // A point switched off may lie outside the stopping set; nothing can be folded there.
  const energies = input.points
    .filter((_, index) => prepared.profiles[index] !== null)
    .map((point) => point.energyKeV);
  const energiesKeV = evenly(Math.min(...energies), Math.max(...energies), CURVE_POINTS);
  return {
    energiesKeV,
    values: Array.from(foldCurve(prepared, valuesOf(fit.answer), energiesKeV)),
  };
}

/** `count` numbers from `low` to `high`, both included. */
function evenly(low: number, high: number, count: number): number[] {
  return Array.from({ length: count }, (_, i) =>
    i === count - 1 ? high : low + ((high - low) * i) / (count - 1),
  );
}
