import type { Polarity } from '@/lib/inversion/index';
import type { DemoSample } from './types';

/** What is behind the invented scans of one piece of a wafer. Depths count from the semiconductor surface. */
export interface Wafer {
  key: string;
  name: string;
  dopingPerCm3: number;
  /** Surface band bending in volt, which with the doping gives the edge. */
  bendingV: number;
  polarity: Polarity;
  treatment: string;
  stack: Stack;
}

export interface Stack {
  material: string;
  carrier: 'electrons' | 'holes';
  capMaterial: string;
  capThicknessNm: number;
  /** Relative permittivity. */
  permittivity: number;
  stoppingKey: string;
  /** Diamagnetic fractions in the cap, without carriers, with carriers. */
  levelCap: number;
  levelEmpty: number;
  levelPopulated: number;
}

/** Permittivities from memory: 4H-SiC 9.7, Ge 16.0 (Sze, Physics of Semiconductor Devices, appendix); the rest is invented. */
const CARBIDE: Stack = {
  material: 'n-type 4H-SiC',
  carrier: 'electrons',
  capMaterial: 'thermal oxide',
  capThicknessNm: 25,
  permittivity: 9.7,
  stoppingKey: 'carbide',
  levelCap: 0.19,
  levelEmpty: 0.36,
  levelPopulated: 0.74,
};
const GERMANIUM: Stack = {
  material: 'p-type Ge',
  carrier: 'holes',
  capMaterial: 'alumina',
  capThicknessNm: 4,
  permittivity: 16,
  stoppingKey: 'germanium',
  levelCap: 0.55,
  levelEmpty: 0.742,
  levelPopulated: 0.318,
};

const OXIDISED = { polarity: 'depletion', treatment: 'as oxidised', stack: CARBIDE } as const;
const ANNEALED = {
  polarity: 'depletion',
  treatment: 'annealed after oxidation',
  stack: CARBIDE,
} as const;

export const WAFERS: readonly Wafer[] = [
  {
    key: 'nb31-oxidised',
    name: 'NB-31 as oxidised',
    dopingPerCm3: 4.0e15,
    bendingV: 0.03,
    ...OXIDISED,
  },
  {
    key: 'nb31-annealed',
    name: 'NB-31 annealed',
    dopingPerCm3: 4.0e15,
    bendingV: 0.012,
    ...ANNEALED,
  },
  {
    key: 'nb34-oxidised',
    name: 'NB-34 as oxidised',
    dopingPerCm3: 1.1e16,
    bendingV: 0.03,
    ...OXIDISED,
  },
  {
    key: 'nb34-annealed',
    name: 'NB-34 annealed',
    dopingPerCm3: 1.1e16,
    bendingV: 0.012,
    ...ANNEALED,
  },
  {
    key: 'nb37-oxidised',
    name: 'NB-37 as oxidised',
    dopingPerCm3: 3.2e16,
    bendingV: 0.045,
    ...OXIDISED,
  },
  {
    key: 'nb37-annealed',
    name: 'NB-37 annealed',
    dopingPerCm3: 3.2e16,
    bendingV: 0.05,
    ...ANNEALED,
    polarity: 'accumulation',
  },
  {
    key: 'hx204',
    name: 'HX-204',
    dopingPerCm3: 6.2e15,
    bendingV: 0.0215,
    polarity: 'depletion',
    treatment: 'alumina deposited at low temperature',
    stack: GERMANIUM,
  },
];

export function waferOf(key: string): Wafer {
  const wafer = WAFERS.find((one) => one.key === key);
  if (!wafer) throw new Error(`the demo has no wafer ${key}`);
  return wafer;
}

/** Relative uncertainty of the doping, as a four-point measurement would leave it; invented. */
const DOPING_ERROR = 0.065;

export function demoSamples(): DemoSample[] {
  return WAFERS.map(({ key, name, dopingPerCm3, treatment, stack }) => ({
    key,
    input: {
      name,
      material: stack.material,
      carrier: stack.carrier,
      dopingPerCm3,
      dopingSigmaPerCm3: dopingSigma(dopingPerCm3),
      capMaterial: stack.capMaterial,
      capThicknessNm: stack.capThicknessNm,
      treatment,
      notes: 'Invented sample of the demo team.',
    },
    invented: true,
  }));
}

export function dopingSigma(dopingPerCm3: number): number {
  return Number((DOPING_ERROR * dopingPerCm3).toPrecision(1));
}

const ELECTRON_CHARGE_C = 1.602176634e-19; // CODATA 2018, exact
const VACUUM_PERMITTIVITY_F_PER_CM = 8.8541878188e-14; // CODATA 2022
const NM_PER_CM = 1e7;

/** Depletion width in the abrupt approximation, W = √(2εφ/(qN)), in nm. */
export function edgeDepthNm({ stack, dopingPerCm3 }: Wafer, bendingV: number): number {
  const permittivity = stack.permittivity * VACUUM_PERMITTIVITY_F_PER_CM;
  return Math.sqrt((2 * permittivity * bendingV) / (ELECTRON_CHARGE_C * dopingPerCm3)) * NM_PER_CM;
}
