import type { ILLUMINATIONS } from '@/lib/schemas/scan';
import { LADDER_KEV } from './stopping-sets';

/** One scan to be simulated: which wafer, in which state, and how the file is written. */
export interface ScanState {
  key: string;
  waferKey: string;
  name: string;
  observable: 'fraction' | 'rate';
  temperatureK: number;
  illumination: (typeof ILLUMINATIONS)[number];
  /** Band bending in this state as a multiple of the wafer's own. */
  bendingFactor: number;
  energiesKeV: readonly number[];
  dress: 'comma' | 'semicolon' | 'blanks';
  notes: string;
}

const LAMP_RULE = 'Lamp and laser sources follow the laser-safety rules of the facility.';
const GATE_RULE = 'Gate bias: high voltage is a matter for the facility and its licensed staff.';
/** Off the ladder at 7 and 15 keV, so that interpolated stopping profiles are seen. */
const OFF_LADDER_KEV = [
  ...LADDER_KEV.filter((energy) => energy !== 8 && energy !== 16),
  7,
  15,
].sort((a, b) => a - b);

const DARK = {
  observable: 'fraction',
  illumination: 'dark',
  bendingFactor: 1,
  energiesKeV: LADDER_KEV,
  dress: 'comma',
  notes: '',
} as const;

export const SCAN_STATES: readonly ScanState[] = [
  {
    ...DARK,
    key: 'nb31-oxidised-dark',
    waferKey: 'nb31-oxidised',
    name: '260 K, dark',
    temperatureK: 260,
  },
  {
    ...DARK,
    key: 'nb31-annealed-dark',
    waferKey: 'nb31-annealed',
    name: '260 K, dark',
    temperatureK: 260,
  },
  {
    ...DARK,
    key: 'nb34-oxidised-dark',
    waferKey: 'nb34-oxidised',
    name: '260 K, dark',
    temperatureK: 260,
  },
  {
    ...DARK,
    key: 'nb34-oxidised-lamp',
    waferKey: 'nb34-oxidised',
    name: '260 K, ultraviolet lamp',
    temperatureK: 260,
    illumination: 'illuminated',
    bendingFactor: 0.25,
    notes: LAMP_RULE,
  },
  {
    ...DARK,
    key: 'nb34-oxidised-after',
    waferKey: 'nb34-oxidised',
    name: '260 K, after lamp',
    temperatureK: 260,
    illumination: 'after illumination',
    bendingFactor: 0.6,
    notes: LAMP_RULE,
  },
  {
    ...DARK,
    key: 'nb34-annealed-dark',
    waferKey: 'nb34-annealed',
    name: '240 K, dark',
    temperatureK: 240,
  },
  {
    ...DARK,
    key: 'nb34-annealed-gate-up',
    waferKey: 'nb34-annealed',
    name: '240 K, dark, gate biased up',
    temperatureK: 240,
    bendingFactor: 0.5,
    notes: GATE_RULE,
  },
  {
    ...DARK,
    key: 'nb34-annealed-gate-down',
    waferKey: 'nb34-annealed',
    name: '240 K, dark, gate biased down',
    temperatureK: 240,
    bendingFactor: 2.4,
    notes: GATE_RULE,
  },
  {
    ...DARK,
    key: 'nb37-oxidised-dark',
    waferKey: 'nb37-oxidised',
    name: '290 K, dark',
    temperatureK: 290,
    dress: 'blanks',
  },
  {
    ...DARK,
    key: 'nb37-annealed-dark',
    waferKey: 'nb37-annealed',
    name: '290 K, dark',
    temperatureK: 290,
    dress: 'blanks',
    energiesKeV: OFF_LADDER_KEV,
  },
  {
    ...DARK,
    key: 'hx204-fraction',
    waferKey: 'hx204',
    name: '205 K, dark',
    temperatureK: 205,
    dress: 'semicolon',
  },
  {
    ...DARK,
    key: 'hx204-rate',
    waferKey: 'hx204',
    name: '205 K, dark, capture rate',
    temperatureK: 205,
    dress: 'semicolon',
    observable: 'rate',
    notes: 'Reduced from temperature scans at each energy.',
  },
];
