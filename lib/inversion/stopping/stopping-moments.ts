import type { StoppingProfile } from '../types';
import { stoppingQuantile } from './stopping-quantile';

export interface StoppingMoments {
  meanNm: number;
  straggleNm: number;
  medianNm: number;
  quantile05Nm: number;
  quantile95Nm: number;
}

/** Mean, rms straggling and quantiles, nm. A uniform bin of width h adds h²/12 to the variance. */
export function stoppingMoments(profile: StoppingProfile): StoppingMoments {
  const { edgesNm, mass } = profile;
  let meanNm = 0;
  for (let b = 0; b < mass.length; b++) meanNm += (mass[b]! * (edgesNm[b]! + edgesNm[b + 1]!)) / 2;
  let variance = 0;
  for (let b = 0; b < mass.length; b++) {
    const width = edgesNm[b + 1]! - edgesNm[b]!;
    const offset = (edgesNm[b]! + edgesNm[b + 1]!) / 2 - meanNm;
    variance += mass[b]! * (offset * offset + (width * width) / 12);
  }
  return {
    meanNm,
    straggleNm: Math.sqrt(variance),
    medianNm: stoppingQuantile(profile, 0.5),
    quantile05Nm: stoppingQuantile(profile, 0.05),
    quantile95Nm: stoppingQuantile(profile, 0.95),
  };
}
