import type { Scan } from '@/lib/schemas/scan';

import { parameterNames, settingOf, type Assumptions } from './assumptions';

/**
 * A text that is the same for two fits exactly when they ask the same question of the same data:
 * settings that play no part (the value of a free parameter, where a number comes from) are left out.
 */
export function questionKey(
  scan: Pick<Scan, 'id' | 'pointsSha256'>,
  setSha256: string,
  assumptions: Assumptions,
): string {
  const { seed, resamples, profile } = assumptions;
  return JSON.stringify([comparisonKey(scan, setSha256, assumptions), profile, seed, resamples]);
}

/** The question without the trial profile: what a comparison of profiles holds in common. */
export function comparisonKey(
  scan: Pick<Scan, 'id' | 'pointsSha256'>,
  setSha256: string,
  assumptions: Assumptions,
): string {
  const { polarity, response, carriers, capThicknessNm, switchedOffKeV } = assumptions;
  const parameters = parameterNames('graded', capThicknessNm).map((name) => {
    const { held, value, prior } = settingOf(assumptions, name);
    return held ? { name, value } : { name, prior };
  });
  return JSON.stringify([
    scan.id,
    scan.pointsSha256,
    setSha256,
    { polarity, response, carriers, capThicknessNm, switchedOffKeV, parameters },
  ]);
}
