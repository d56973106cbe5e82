import { describe, expect, it } from 'vitest';
import {
  carrierProfile,
  fit,
  prepareFit,
  runChecks,
  simulateScan,
  type Check,
  type FitInput,
} from '@/lib/inversion/index';
import { answerOf, fractionInput } from './support/scans';

const GE_300_K = { relativePermittivity: 16.2, temperatureK: 300, intrinsicPerCm3: 2e13 };

function checksOf(edgeWidthNm: number, bulkPerCm3: number, gapEv: number | null): Check[] {
  const input: FitInput = fractionInput(
    {
      semiconductor: { ...GE_300_K, gapEv },
      carriers: { bulkPerCm3, bulkSigmaPerCm3: null, topPerCm3: null },
    },
    0.002,
  );
  const values = { edgeDepthNm: 75, edgeWidthNm, levelTop: 0.74, levelBulk: 0.32 };
  const prepared = prepareFit({ ...input, points: simulateScan({ input, values, seed: 1 }) });
  const answer = answerOf(fit(prepared));
  return runChecks(prepared, answer, carrierProfile(prepared, answer));
}

const stateOf = (checks: Check[], id: string): Check | undefined =>
  checks.find((check) => check.id === id);

describe('an edge against electrostatics', () => {
  // Source: L_D = √(ε kT/(q²N)) by hand: ε_r 16.2, 300 K, 1e15 cm⁻³ give 152 nm, 1e18 give 4.8 nm; 0.66 L_D is 100 and 3.2 nm.
  it('says when it is sharper than carriers can end', () => {
    const dilute = stateOf(checksOf(16, 1e15, null), 'debye-length')!;
    expect(dilute.state).toBe('caution');
    expect(dilute.message).toMatch(/Debye length of 152 nm .* at least 100 nm wide/);
    const dense = stateOf(checksOf(16, 1e18, null), 'debye-length')!;
    expect(dense.state).toBe('fine');
    expect(dense.message).toMatch(/Debye length of 4\.81 nm/);
  });

  // Source: φ = qNW²/2ε by hand: 75 nm in 1e18 cm⁻³ at ε_r 16.2 bend the bands by 3.14 eV, in 1e17 by 0.31 eV; the gap of
  // germanium is 0.66 eV (Sze, from memory).
  it('says when it asks for bands bent by more than the gap', () => {
    const steep = stateOf(checksOf(16, 1e18, 0.66), 'band-bending')!;
    expect(steep.state).toBe('problem');
    expect(steep.message).toMatch(/bends the bands by 3\.\d+ eV, with a gap of 0\.66 eV/);
    expect(stateOf(checksOf(16, 1e17, 0.66), 'band-bending')!.state).toBe('fine');
  });

  it('says nothing where the bulk or the gap is not known', () => {
    expect(stateOf(checksOf(16, 1e17, null), 'band-bending')).toBeUndefined();
    const input = fractionInput({}, 0.002);
    const values = { edgeDepthNm: 75, edgeWidthNm: 16, levelTop: 0.74, levelBulk: 0.32 };
    const prepared = prepareFit({ ...input, points: simulateScan({ input, values, seed: 1 }) });
    const answer = answerOf(fit(prepared));
    const checks = runChecks(prepared, answer, carrierProfile(prepared, answer));
    expect(stateOf(checks, 'debye-length')).toBeUndefined();
  });
});
