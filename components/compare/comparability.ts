import type { Fit } from '@/lib/schemas/fit';

export type Comparability = { comparable: true } | { comparable: false; reason: string };

/** Energies (keV) that a fit really used, ascending. */
export function usedEnergiesKeV(fit: Fit): number[] {
  return fit.answer.residuals
    .filter((residual) => residual.enabled)
    .map((residual) => residual.energyKeV)
    .toSorted((a, b) => a - b);
}

/**
 * χ², AICc and BIC weigh models of the same data only. Two fits saw the same data when
 * the frozen points have the same hash and the same points were switched on.
 */
export function comparability(fits: readonly Fit[]): Comparability {
  const [first, ...others] = fits;
  if (!first) return { comparable: false, reason: 'There is no fit to compare.' };
  for (const other of others) {
    if (other.scanId !== first.scanId) {
      return {
        comparable: false,
        reason: `“${other.name}” is a fit of another scan, ${other.scanName}.`,
      };
    }
    if (other.hashes.points !== first.hashes.points) {
      return {
        comparable: false,
        reason: `The scan was edited between “${first.name}” and “${other.name}”: they hold different points.`,
      };
    }
    const apart = differentEnergies(first, other);
    if (apart) return { comparable: false, reason: apart };
  }
  return { comparable: true };
}

function differentEnergies(first: Fit, other: Fit): string | null {
  const ofFirst = usedEnergiesKeV(first);
  const ofOther = usedEnergiesKeV(other);
  const onlyFirst = ofFirst.filter((energy) => !ofOther.includes(energy));
  const onlyOther = ofOther.filter((energy) => !ofFirst.includes(energy));
  if (onlyFirst.length === 0 && onlyOther.length === 0) return null;
  const parts = [
    onlyFirst.length > 0 ? `“${first.name}” alone uses ${energyList(onlyFirst)}` : null,
    onlyOther.length > 0 ? `“${other.name}” alone uses ${energyList(onlyOther)}` : null,
  ].filter((part) => part !== null);
  return `Different points were switched on: ${parts.join('; ')}.`;
}

/** "none", "14 keV" or "2, 4 and 14 keV". */
export function energyList(energiesKeV: readonly number[]): string {
  if (energiesKeV.length === 0) return 'none';
  const words = energiesKeV.map(String);
  const last = words.pop();
  return words.length === 0 ? `${last} keV` : `${words.join(', ')} and ${last} keV`;
}
