import { createStoppingProfile, createStoppingSet, type FitInput } from '@/lib/inversion/index';
import type { Fit } from '@/lib/schemas/fit';
import type { StoppingSetAnswer } from '@/lib/schemas/stopping-set';

/** The frozen fit as the input of the inversion, so that its curves can be drawn again. */
export function fitInputOf(fit: Fit, set: StoppingSetAnswer): FitInput {
  const { spec } = fit;
  const off = new Set(spec.switchedOffKeV);
  return {
    observable: fit.observable,
    points: fit.points.map((point) => ({
      ...point,
      enabled: point.enabled && !off.has(point.energyKeV),
    })),
    stopping: createStoppingSet(
      set.profiles.map(({ energyKeV, edgesNm, mass, lostShare }) =>
        createStoppingProfile({
          energyKeV,
          positionsNm: edgesNm,
          positionsAre: 'edges',
          weights: mass,
          weightsAre: 'counts',
          lostShare: lostShare ?? undefined,
        }),
      ),
    ),
    profile: spec.profile,
    polarity: spec.polarity,
    response: spec.response,
    carriers: spec.carriers,
    capThicknessNm: spec.capThicknessNm,
    parameters: spec.parameters,
  };
}
