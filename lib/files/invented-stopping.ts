export interface InventedStopping {
  energyKeV: number;
  /** Mean depth at 6 keV, nm. */
  meanDepthAt6KeV: number;
  binWidthNm: number;
  bins: number;
  implanted: number;
}

/** From 45 nm at 6 keV to 85 nm at 14 keV, as in germanium (common practice, no source). */
const RANGE_EXPONENT = 0.75;
/** Share scattered back at the surface, falling with energy; invented. */
const backscattered = (energyKeV: number) => 0.012 * Math.exp(-energyKeV / 6);

/**
 * Whole counts per bin of an invented stopping profile of the right kind: density ∝ x·exp(−(x/x₀)²),
 * so the share above x is 1 − exp(−(x/x₀)²) and the mean is x₀·√π/2 (A. F. Makhov, Sov. Phys. Solid
 * State 2, 1934 (1960), exponent 2, from memory). It stands in for a stopping calculation in
 * templates, fixtures and demo data, and nowhere else.
 */
export function inventedStoppingCounts(stopping: InventedStopping): number[] {
  const { energyKeV, bins, binWidthNm, implanted } = stopping;
  const meanNm = stopping.meanDepthAt6KeV * (energyKeV / 6) ** RANGE_EXPONENT;
  const scaleNm = (2 * meanNm) / Math.sqrt(Math.PI);
  const deeperThan = (xNm: number) => Math.exp(-((xNm / scaleNm) ** 2));
  const stopped = implanted * (1 - backscattered(energyKeV));
  return Array.from({ length: bins }, (_, bin) =>
    Math.round(stopped * (deeperThan(bin * binWidthNm) - deeperThan((bin + 1) * binWidthNm))),
  );
}
