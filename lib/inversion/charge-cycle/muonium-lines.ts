import { checkNumber } from './check-cycle';
import { ELECTRON_MHZ_PER_T, MUON_MHZ_PER_T } from './muon-constants';

/** One precession line of neutral muonium in a transverse field. */
export interface MuoniumLine {
  /** Signed: the sense of precession counts. */
  frequencyMHz: number;
  /** Share of the muon polarisation in this line; the four sum to 1. */
  weight: number;
}

/** Signed frequency of the diamagnetic line, −γ_µB/2π, MHz. */
export function diamagneticMHz(fieldMt: number): number {
  return (-MUON_MHZ_PER_T * fieldMt) / 1000;
}

/**
 * The four lines of isotropic muonium (Breit and Rabi, Phys. Rev. 38, 2082 (1931)) in the field B, for
 * H/h = A·S·I + ν_e S_z − ν_µ I_z with ν_e = γ_eB/2π and ν_µ = γ_µB/2π, weights from σ₊(t) of the muon with an unpolarised
 * electron. With x = (ν_e + ν_µ)/A, δ = x/√(1 + x²), D = A√(1 + x²):
 * ±A/2 + (ν_e − ν_µ)/2 ∓ D/2 with weights (1 ± δ)/4 and ±A/2 + (ν_e − ν_µ)/2 ± D/2 with weights (1 ∓ δ)/4, in the order
 * ↑↑↔upper, ↑↑↔lower, upper↔↓↓, lower↔↓↓.
 *
 * @throws InversionError for a hyperfine constant that is not positive or a negative field.
 */
export function breitRabiLines(hyperfineMHz: number, fieldMt: number): MuoniumLine[] {
  checkNumber(hyperfineMHz, 'hyperfine constant', 'MHz');
  checkNumber(fieldMt, 'field', 'mT', true);
  const electron = (ELECTRON_MHZ_PER_T * fieldMt) / 1000;
  const muon = (MUON_MHZ_PER_T * fieldMt) / 1000;
  const splitting = Math.hypot(hyperfineMHz, electron + muon);
  const delta = (electron + muon) / splitting;
  const shift = (electron - muon) / 2;
  return [
    { frequencyMHz: hyperfineMHz / 2 + shift - splitting / 2, weight: (1 + delta) / 4 },
    { frequencyMHz: hyperfineMHz / 2 + shift + splitting / 2, weight: (1 - delta) / 4 },
    { frequencyMHz: -hyperfineMHz / 2 + shift + splitting / 2, weight: (1 - delta) / 4 },
    { frequencyMHz: -hyperfineMHz / 2 + shift - splitting / 2, weight: (1 + delta) / 4 },
  ];
}
