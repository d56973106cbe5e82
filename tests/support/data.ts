import { fitInputOf, frozenPoints } from '@/db/access/fit/frozen-inputs';
import { recompute } from '@/db/access/fit/recompute';
import { saveFit } from '@/db/access/fit/save-fit';
import { createSample } from '@/db/access/sample/create-sample';
import { createScan } from '@/db/access/scan/create-scan';
import { readScan } from '@/db/access/scan/read-scan';
import { createStoppingSet } from '@/db/access/stopping-set/create-stopping-set';
import { loadStoppingSet } from '@/db/access/stopping-set/load-stopping-set';
import { scanTemplate, stoppingMatrixTemplate } from '@/lib/files/templates';
import type { FitSpec, SaveFitInput } from '@/lib/schemas/fit';
import type { SampleInput } from '@/lib/schemas/sample';

import type { TestPerson } from './people';

export const SAMPLE: SampleInput = {
  name: 'Wafer 7',
  material: '4H silicon carbide',
  carrier: 'electrons',
  dopingPerCm3: 1.1e16,
  dopingSigmaPerCm3: 1e15,
  capMaterial: '',
  capThicknessNm: null,
  treatment: '',
  notes: '',
};

export const SCAN_META = {
  name: 'Dark, 260 K',
  observable: 'fraction' as const,
  temperatureK: 260,
  fieldMT: 10,
  illumination: 'dark' as const,
  measuredOn: '2026-03-04',
  notes: '',
};

export const SCAN_READING = {
  delimiter: 'comma' as const,
  decimal: 'point' as const,
  columns: { energy: 0, value: 1, sigma: 2, note: 3, counts: null },
  energyUnit: 'keV' as const,
  asymmetry: null,
  skipLines: [],
};

export const STOPPING_META = { name: 'Bare wafer', layerStack: '4H-SiC', origin: '', notes: '' };

export const STOPPING_READING = {
  depthUnit: 'nm' as const,
  positionsAre: 'centres' as const,
  weightsAre: 'counts' as const,
  implantedPerEnergy: 100_000,
  files: [
    { delimiter: 'comma' as const, decimal: 'point' as const, energyKeV: null, skipLines: [] },
  ],
};

export const SPEC: FitSpec = {
  profile: 'graded',
  polarity: 'depletion',
  response: { kind: 'two-level' },
  carriers: { bulkPerCm3: 1.1e16, bulkSigmaPerCm3: null, topPerCm3: null },
  capThicknessNm: 0,
  parameters: {},
  switchedOffKeV: [],
  seed: 7,
  resamples: 60,
};

export const bytesOf = (text: string) => new TextEncoder().encode(text);

export function scanInput(sampleId: string) {
  const { fileName, text } = scanTemplate();
  const source = { kind: 'file', name: fileName, bytes: bytesOf(text), reading: SCAN_READING };
  return { sampleId, meta: SCAN_META, source };
}

export function stoppingInput() {
  const { fileName, text } = stoppingMatrixTemplate();
  const files = [{ name: fileName, bytes: bytesOf(text) }];
  return { meta: STOPPING_META, reading: STOPPING_READING, files };
}

export interface TestData {
  sampleId: string;
  scanId: string;
  stoppingSetId: string;
}

/** A sample with a scan from a file, and a stopping set. */
export async function testData(person: TestPerson): Promise<TestData> {
  const { id: sampleId } = await createSample(await person.context(), SAMPLE);
  const { id: scanId } = await createScan(await person.context(), scanInput(sampleId));
  const { id: stoppingSetId } = await createStoppingSet(await person.context(), stoppingInput());
  return { sampleId, scanId, stoppingSetId };
}

/** What an honest browser sends: everything computed from what the server handed out. */
export async function honestFit(
  person: TestPerson,
  { scanId, stoppingSetId }: TestData,
  given: Partial<FitSpec> = {},
): Promise<SaveFitInput> {
  const spec = { ...SPEC, ...given };
  const ctx = await person.context();
  const scan = await readScan(ctx, { id: scanId });
  const stopping = await loadStoppingSet(ctx.db, stoppingSetId);
  const points = frozenPoints(scan.points, spec.switchedOffKeV);
  const input = fitInputOf({ observable: scan.observable, points, spec, stopping });
  const { answer, carrierProfile: profile } = await recompute(input, spec);
  const claimed = JSON.parse(JSON.stringify({ answer, profile })) as SaveFitInput['claimed'];
  return {
    scanId,
    stoppingSetId,
    name: 'Graded edge',
    notes: '',
    parentFitId: null,
    spec,
    claimed,
  };
}

export async function savedFit(
  person: TestPerson,
  data: TestData,
  given: Partial<FitSpec> = {},
): Promise<string> {
  const { id } = await saveFit(await person.context(), await honestFit(person, data, given));
  return id;
}
