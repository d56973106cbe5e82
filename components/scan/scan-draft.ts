import { ILLUMINATIONS, OBSERVABLES, type Scan } from '@/lib/schemas/scan';

/** What is known of a scan, as it stands in the form: numbers are still text. */
export interface ScanDraft {
  name: string;
  observable: Scan['observable'];
  temperatureK: string;
  fieldMT: string;
  illumination: Scan['illumination'];
  measuredOn: string;
  notes: string;
}

export const NEW_SCAN: ScanDraft = {
  name: '',
  observable: 'fraction',
  temperatureK: '',
  fieldMT: '',
  illumination: 'dark',
  measuredOn: '',
  notes: '',
};

export function draftOfScan(scan: Scan): ScanDraft {
  const { name, observable, illumination, measuredOn, notes } = scan;
  const text = (value: number | null) => (value === null ? '' : String(value));
  return {
    name,
    observable,
    illumination,
    measuredOn,
    notes,
    temperatureK: text(scan.temperatureK),
    fieldMT: text(scan.fieldMT),
  };
}

const OBSERVABLE_WORDS: Record<Scan['observable'], string> = {
  fraction: 'diamagnetic fraction (0 to 1)',
  rate: 'capture rate (µs⁻¹)',
};

export const OBSERVABLE_OPTIONS = OBSERVABLES.map((value) => ({
  value,
  label: OBSERVABLE_WORDS[value],
}));
export const ILLUMINATION_OPTIONS = ILLUMINATIONS.map((value) => ({ value, label: value }));

export function observableOf(value: string): Scan['observable'] {
  return OBSERVABLES.find((known) => known === value) ?? 'fraction';
}

export function illuminationOf(value: string): Scan['illumination'] {
  return ILLUMINATIONS.find((known) => known === value) ?? 'dark';
}
