import type { Scan } from '@/lib/schemas/scan';

/** "13 energies, 2 to 22 keV, 205 K, dark". */
export function scanSentence(
  scan: Pick<Scan, 'temperatureK' | 'illumination'> & { points: readonly { energyKeV: number }[] },
): string {
  const energies = scan.points.map(({ energyKeV }) => energyKeV);
  const span = `${energies.length} energies, ${Math.min(...energies)} to ${Math.max(...energies)} keV`;
  return [span, scan.temperatureK === null ? null : `${scan.temperatureK} K`, scan.illumination]
    .filter(Boolean)
    .join(', ');
}
