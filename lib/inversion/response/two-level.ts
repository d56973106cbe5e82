import type { ResponseModel } from './response-model';

/**
 * Two-level fraction: y = F_top + (F_bulk − F_top)·s. The levels say nothing of a concentration; the profile is the
 * populated share (s under depletion, 1 − s under accumulation), or cm⁻³ where the concentrations on both sides are known.
 */
export const twoLevel: ResponseModel = {
  observable: 'fraction',
  levelBounds: () => [0, 1],
  capBounds: [0, 1],
  unit: (_response, carriers, polarity) =>
    carriers.bulkPerCm3 !== null && (polarity === 'depletion' || carriers.topPerCm3 !== null)
      ? 'cm⁻³'
      : 'populated share',
  line(_levelTop, _levelBulk, { response, carriers, polarity }) {
    if (twoLevel.unit(response, carriers, polarity) === 'cm⁻³') {
      const top = carriers.topPerCm3 ?? 0;
      return { offset: top, slope: carriers.bulkPerCm3! - top };
    }
    return polarity === 'depletion' ? { offset: 0, slope: 1 } : { offset: 1, slope: -1 };
  },
  valueOfChange: (change, contrast, input) =>
    (change / Math.abs(contrast)) * Math.abs(twoLevel.line(0, 1, input).slope),
};
