import { asEntered } from '@/lib/format';
import type { Scan } from '@/lib/schemas/scan';

export const OBSERVABLE_WORDS: Record<Scan['observable'], string> = {
  fraction: 'diamagnetic fraction',
  rate: 'capture rate',
};

/** Conditions of a scan in the order in which they are read: "205 K", "10 mT", "dark", "2026-03-14". */
export function conditionWords(
  scan: Pick<Scan, 'temperatureK' | 'fieldMT' | 'illumination' | 'measuredOn'>,
): string[] {
  const { temperatureK, fieldMT, illumination, measuredOn } = scan;
  return [
    temperatureK === null ? '' : `${asEntered(temperatureK)} K`,
    fieldMT === null ? '' : `${asEntered(fieldMT)} mT`,
    illumination,
    measuredOn === '' ? '' : `measured on ${measuredOn}`,
  ].filter((words) => words !== '');
}

/** "13 energies, 2 to 22 keV" */
export function energySpan(energiesKeV: readonly number[]): string {
  if (energiesKeV.length === 0) return 'no energies';
  const [low, high] = [Math.min(...energiesKeV), Math.max(...energiesKeV)];
  if (low === high) return `1 energy, ${asEntered(low)} keV`;
  return `${energiesKeV.length} energies, ${asEntered(low)} to ${asEntered(high)} keV`;
}
