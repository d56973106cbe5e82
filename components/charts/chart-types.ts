import type { CarrierProfile, Residual } from '@/lib/inversion/index';

/** What a scan panel draws of a point; a `Residual` is one, and so is a point that was never fitted. */
export type ScanMark = Pick<
  Residual,
  'energyKeV' | 'observed' | 'sigma' | 'enabled' | 'interpolated'
>;

export type LineStyle = 'solid' | 'dashed';

/** A smooth folded curve over implantation energy. */
export interface ScanCurve {
  label: string;
  style: LineStyle;
  /** A CSS colour; coral for solid and tide for dashed when left out. */
  colour?: string;
  energiesKeV: ArrayLike<number>;
  values: ArrayLike<number>;
}

export interface ResidualSeries {
  label: string;
  style: LineStyle;
  colour?: string;
  residuals: readonly Residual[];
}

export interface ProfileSeries {
  label: string;
  style: LineStyle;
  colour?: string;
  profile: CarrierProfile;
}

/** One stopping profile as a ridge; depths count from the surface of the stack, cap included. */
export interface Ridge {
  energyKeV: number;
  edgesNm: ArrayLike<number>;
  mass: ArrayLike<number>;
  interpolated?: boolean;
}

/** How much the scan knows about carriers at each depth, 0 to 1. */
export interface DepthInformation {
  depthsNm: ArrayLike<number>;
  values: ArrayLike<number>;
}

/** Space round the plotting area, px. */
export interface Margin {
  top: number;
  right: number;
  bottom: number;
  left: number;
}

export const strokeOf = (series: { style: LineStyle; colour?: string }): string =>
  series.colour ?? (series.style === 'solid' ? 'var(--coral)' : 'var(--tide)');

export const dashOf = (style: LineStyle): string | undefined =>
  style === 'dashed' ? '5 4' : undefined;

export const OBSERVABLE_LABEL = {
  fraction: 'diamagnetic fraction',
  rate: 'capture rate (µs⁻¹)',
} as const;
