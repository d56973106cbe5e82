import { readTable } from '@/lib/files/read-table';
import { readStoppingFiles } from '@/lib/files/stopping-file';
import {
  simulateScan,
  type FitInput,
  type ParameterValues,
  type ScanPoint,
  type StoppingSet,
} from '@/lib/inversion/index';
import { scanFile } from './scan-file';
import { SCAN_STATES, type ScanState } from './scan-states';
import type { DemoScan, DemoStoppingSet } from './types';
import { edgeDepthNm, waferOf, type Wafer } from './wafers';

/** The edge that the probe sees is sharper than the depletion region is wide: width over depth, invented. */
const WIDTH_OVER_DEPTH = 0.12;
/**
 * Capture coefficient of the demo. Invented, and far below the rule of thumb for germanium (about 1 µs⁻¹
 * per 10¹² cm⁻³ near 200 K, common practice, no source), which would put this wafer's rate out of reach.
 */
export const DEMO_GAMMA = {
  gammaCm3PerS: 8e-10,
  gammaSigmaCm3PerS: 6e-11,
  baselinePerUs: 0.05,
} as const;
const CAP_RATE_PER_US = 0.2;
const PER_US = 1e-6;
const SEED_STEP = 7919;
const FIRST_DAY = Date.UTC(2026, 1, 3);
const DAY_MS = 86_400_000;

/** Every scan of the demo, simulated by the library from the truth of its wafer, and written to a file. */
export function demoScans(seed: number, stoppingSets: readonly DemoStoppingSet[]): DemoScan[] {
  return SCAN_STATES.map((state, index) => {
    const wafer = waferOf(state.waferKey);
    const stopping = stoppingSetOf(stoppingSets, wafer.stack.stoppingKey);
    const input = templateOf(state, wafer, stopping);
    const scanSeed = (seed + SEED_STEP * index) >>> 0;
    const points = simulateScan({ input, values: truthOf(state, wafer), seed: scanSeed });
    return {
      key: state.key,
      sampleKey: wafer.key,
      meta: {
        name: state.name,
        observable: state.observable,
        temperatureK: state.temperatureK,
        fieldMT: 10,
        illumination: state.illumination,
        measuredOn: new Date(FIRST_DAY + index * DAY_MS).toISOString().slice(0, 10),
        notes: ['Invented scan of the demo team.', state.notes].filter(Boolean).join(' '),
      },
      ...scanFile(state, points),
      invented: true,
    };
  });
}

function stoppingSetOf(sets: readonly DemoStoppingSet[], key: string): StoppingSet {
  const found = sets.find((one) => one.key === key);
  if (!found) throw new Error(`the demo has no stopping set ${key}`);
  const tables = found.files.map(({ fileName, text }) => {
    const read = readTable(fileName, new TextEncoder().encode(text));
    if (!read.ok) throw new Error(read.problems.map(({ message }) => message).join(' '));
    return read.table;
  });
  const { set, problems } = readStoppingFiles(tables, { depthUnit: 'nm', weightsAre: 'counts' });
  if (!set) throw new Error(problems.map(({ message }) => message).join(' '));
  return set;
}

function templateOf(state: ScanState, { stack, polarity }: Wafer, stopping: StoppingSet): FitInput {
  return {
    observable: state.observable,
    points: state.energiesKeV.map((energyKeV) => pointAt(energyKeV, state.observable)),
    stopping,
    profile: 'graded',
    polarity,
    response:
      state.observable === 'rate' ? { kind: 'capture-rate', ...DEMO_GAMMA } : { kind: 'two-level' },
    carriers: { bulkPerCm3: null, bulkSigmaPerCm3: null, topPerCm3: null },
    capThicknessNm: stack.capThicknessNm,
    parameters: {},
  };
}

/** Slow muons are fewer: σ grows towards low energies. Rounded to what the file will show. */
function pointAt(energyKeV: number, observable: 'fraction' | 'rate'): ScanPoint {
  const base = observable === 'rate' ? 0.07 : 0.0042;
  const sigma = Number((base * Math.sqrt(1 + 2 / energyKeV)).toFixed(4));
  return { energyKeV, value: 0, sigma, enabled: true };
}

function truthOf(state: ScanState, wafer: Wafer): ParameterValues {
  const edgeNm = edgeDepthNm(wafer, wafer.bendingV * state.bendingFactor);
  const shape = { edgeDepthNm: edgeNm, edgeWidthNm: WIDTH_OVER_DEPTH * edgeNm, depthScale: 1 };
  if (state.observable === 'rate') {
    const { gammaCm3PerS, baselinePerUs } = DEMO_GAMMA;
    const levelBulk = baselinePerUs + gammaCm3PerS * wafer.dopingPerCm3 * PER_US;
    return { ...shape, levelTop: baselinePerUs, levelBulk, levelCap: CAP_RATE_PER_US };
  }
  const { levelCap, levelEmpty, levelPopulated } = wafer.stack;
  // An accumulated surface shows the full level; the bulk behind it is then only partly converted.
  const levels =
    wafer.polarity === 'accumulation'
      ? { levelTop: levelPopulated, levelBulk: (levelEmpty + levelPopulated) / 2 }
      : { levelTop: levelEmpty, levelBulk: levelPopulated };
  return { ...shape, ...levels, levelCap };
}
