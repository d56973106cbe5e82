import { InversionError } from '../errors';

export type SurfaceRegime =
  'accumulation' | 'flat band' | 'depletion' | 'weak inversion' | 'strong inversion';

/**
 * Name of what the surface does at band bending φ_s (eV, > 0 towards depletion) in a bulk of Fermi potential φ_F (eV):
 * depletion to φ_F, weak inversion to 2φ_F where the surface holds as many minority carriers as the bulk holds majority
 * carriers, strong inversion beyond (Sze, section 4.2.1).
 *
 * @throws InversionError for numbers that are not finite or a negative φ_F.
 */
export function surfaceRegime(bandBendingEv: number, fermiPotentialEv: number): SurfaceRegime {
  if (!Number.isFinite(bandBendingEv) || !(fermiPotentialEv >= 0)) {
    throw new InversionError(
      'bad-number',
      `The band bending and the Fermi potential cannot be ${bandBendingEv} eV and ${fermiPotentialEv} eV.`,
    );
  }
  if (bandBendingEv < 0) return 'accumulation';
  if (bandBendingEv === 0) return 'flat band';
  if (bandBendingEv < fermiPotentialEv) return 'depletion';
  return bandBendingEv < 2 * fermiPotentialEv ? 'weak inversion' : 'strong inversion';
}
