import { scaleLinear, scaleLog, type ScaleContinuousNumeric } from 'd3';

import type { ProfileSeries } from './chart-types';
import { decades, logDomain } from './log-domain';

export interface CarrierScale {
  y: ScaleContinuousNumeric<number, number>;
  ticks: { position: number; label: string; exponent?: string }[];
  /** Lowest value that the axis shows; what is below leaves the panel through its lower edge. */
  lowest: number;
  logarithmic: boolean;
}

/** Vertical scale of a carrier panel: logarithmic for concentrations, 0 to 1 for a populated share. */
export function carrierScale(
  series: readonly ProfileSeries[],
  top: number,
  height: number,
): CarrierScale {
  const profiles = series.map((one) => one.profile);
  if (!profiles.some((profile) => profile.unit === 'cm⁻³')) return shareScale(top, height);
  const values = profiles.flatMap((profile) =>
    profile.points.flatMap((point) => [point.value, point.upper68, point.upper95]),
  );
  const floors = profiles.flatMap((profile) => (profile.floor === null ? [] : [profile.floor]));
  const domain = logDomain(values, floors.length > 0 ? Math.min(...floors) : null);
  const y = scaleLog()
    .domain(domain)
    .range([top + height, top]);
  const ticks = decades(domain).map((power) => ({
    position: y(10 ** power),
    label: '10',
    exponent: `${power}`,
  }));
  return { y, ticks, lowest: domain[0], logarithmic: true };
}

function shareScale(top: number, height: number): CarrierScale {
  const y = scaleLinear()
    .domain([-0.05, 1.08])
    .range([top + height, top]);
  const ticks = [0, 0.25, 0.5, 0.75, 1].map((share) => ({
    position: y(share),
    label: share.toFixed(2),
  }));
  return { y, ticks, lowest: -0.05, logarithmic: false };
}
