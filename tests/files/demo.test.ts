import { describe, expect, it } from 'vitest';
import { generateDemo } from '@/db/demo/generate';
import { SCAN_STATES } from '@/db/demo/scan-states';
import type { DemoFile, DemoFit } from '@/db/demo/types';
import { edgeDepthNm, waferOf } from '@/db/demo/wafers';
import { readScan } from '@/lib/files/scan-file';
import { readStoppingFiles } from '@/lib/files/stopping-file';
import { fit, prepareFit, stoppingMoments, type FitAnswer } from '@/lib/inversion/index';
import { roleSchema, ROLES } from '@/lib/schemas/common';
import { fitSpecSchema } from '@/lib/schemas/fit';
import { sampleInputSchema } from '@/lib/schemas/sample';
import { scanMetaSchema, scanReadingSchema } from '@/lib/schemas/scan';
import { stoppingMetaSchema, stoppingReadingSchema } from '@/lib/schemas/stopping-set';
import { tableOf } from '../support/fixture';

const SEED = 20_260_203;
const demo = generateDemo(SEED);

function byKey<T extends { key: string }>(list: readonly T[], key: string): T {
  const found = list.find((one) => one.key === key);
  if (!found) throw new Error(`nothing is called ${key}`);
  return found;
}

const asTable = ({ fileName, text }: DemoFile) => tableOf(text, fileName);

function scanOf(key: string) {
  const { file, meta, reading } = byKey(demo.scans, key);
  const { observable } = scanMetaSchema.parse(meta);
  const { columns, energyUnit, asymmetry, skipLines, delimiter, decimal } = reading;
  const table = tableOf(file.text, file.fileName, { delimiter, decimal });
  return {
    observable,
    ...readScan(table, columns, { observable, energyUnit, asymmetry, skipLines }),
  };
}

function stoppingOf(key: string) {
  const { files, reading } = byKey(demo.stoppingSets, key);
  const { implantedPerEnergy, depthUnit, positionsAre, weightsAre } =
    stoppingReadingSchema.parse(reading);
  return readStoppingFiles(files.map(asTable), {
    depthUnit,
    positionsAre,
    weightsAre,
    implantedPerEnergy,
  });
}

function answerOf({ scanKey, stoppingKey, spec }: DemoFit): FitAnswer {
  const { observable, points } = scanOf(scanKey);
  const { set } = stoppingOf(stoppingKey);
  if (!set) throw new Error('no stopping set');
  const outcome = fit(prepareFit({ ...spec, observable, points, stopping: set }));
  if (outcome.status === 'no-minimum') throw new Error(outcome.reason);
  return outcome.answer;
}

describe('the demo team', () => {
  it('is the same to the byte for the same seed, and another one for another seed', () => {
    expect(generateDemo(SEED)).toEqual(demo);
    const other = generateDemo(SEED + 1);
    expect(other.scans.map(({ file }) => file.text)).not.toEqual(
      demo.scans.map(({ file }) => file.text),
    );
    expect(other.stoppingSets).toEqual(demo.stoppingSets);
  });

  it('has one person per role, with addresses that cannot exist', () => {
    expect(demo.people.map(({ role }) => roleSchema.parse(role))).toEqual([...ROLES]);
    // RFC 2606, section 2: names under .example are reserved and never resolve.
    expect(demo.people.every(({ email }) => /^[a-z.]+@northbank\.example$/.test(email))).toBe(true);
  });

  it('says of everything that it is invented', () => {
    const { people, samples, stoppingSets, scans, fits, team } = demo;
    const all = [team, ...people, ...samples, ...stoppingSets, ...scans, ...fits];
    expect(all.every(({ invented }) => invented)).toBe(true);
    const files = [...scans.map(({ file }) => file), ...stoppingSets.flatMap((set) => set.files)];
    expect(files.every(({ text }) => text.startsWith('# invented numbers'))).toBe(true);
  });

  it('fits the forms', () => {
    demo.samples.forEach(({ input }) => sampleInputSchema.parse(input));
    demo.scans.forEach(({ meta, reading }) => [
      scanMetaSchema.parse(meta),
      scanReadingSchema.parse(reading),
    ]);
    demo.stoppingSets.forEach(({ meta }) => stoppingMetaSchema.parse(meta));
    demo.fits.forEach(({ spec }) => fitSpecSchema.parse(spec));
    expect(demo.samples).toHaveLength(7);
    expect(new Set(demo.scans.map(({ meta }) => meta.illumination))).toEqual(
      new Set(['dark', 'illuminated', 'after illumination']),
    );
  });

  it('names only what is there, and a parent before its revision', () => {
    demo.scans.forEach(({ sampleKey }) => byKey(demo.samples, sampleKey));
    demo.fits.forEach(({ parentKey, authorKey, events, scanKey, stoppingKey }, index) => {
      byKey(demo.scans, scanKey);
      byKey(demo.stoppingSets, stoppingKey);
      [authorKey, ...events.map((event) => event.byKey)].forEach((key) => byKey(demo.people, key));
      if (parentKey) byKey(demo.fits.slice(0, index), parentKey);
    });
  });

  it('has two accepted fits, one in review with a thread, one returned with a reason, none judged by its author', () => {
    const outcomes = demo.fits.map(({ outcome }) => outcome);
    const count = (outcome: string) => outcomes.filter((one) => one === outcome).length;
    expect([count('accepted'), count('submitted'), count('returned')]).toEqual([2, 1, 1]);
    const inReview = demo.fits.find(({ outcome }) => outcome === 'submitted');
    expect(inReview?.events.filter(({ kind }) => kind === 'comment').length).toBeGreaterThan(1);
    for (const { events, outcome, authorKey } of demo.fits) {
      const decision = events.find(({ kind }) => kind === 'accepted' || kind === 'returned');
      expect(decision?.kind ?? 'none').toBe(
        ['accepted', 'returned'].includes(outcome) ? outcome : 'none',
      );
      expect(decision?.byKey).not.toBe(authorKey);
      if (outcome === 'returned') expect(decision?.body).not.toBe('');
    }
  });
});

describe('its files', () => {
  it.each(SCAN_STATES.map(({ key }) => key))('%s is read without a problem', (key) => {
    const { points, problems } = scanOf(key);
    expect(problems).toEqual([]);
    expect(points).toHaveLength(13);
  });

  it.each(['carbide', 'germanium'])(
    'the %s stopping set is read without a problem or a warning',
    (key) => {
      const { set, problems, warnings } = stoppingOf(key);
      expect([problems, warnings]).toEqual([[], []]);
      expect(set?.profiles).toHaveLength(13);
      expect(set?.profiles[0]?.mass).toHaveLength(320);
    },
  );

  // 6 keV 40 to 50 nm, 14 keV 80 to 90 nm in germanium: common practice, no source.
  it('muons stop in germanium where they are known to', () => {
    const mean = (energyKeV: number) => {
      const profile = stoppingOf('germanium').set?.profiles.find(
        (one) => one.energyKeV === energyKeV,
      );
      return profile ? stoppingMoments(profile).meanNm : Number.NaN;
    };
    expect([mean(6) > 40, mean(6) < 50, mean(14) > 80, mean(14) < 90]).toEqual([
      true,
      true,
      true,
      true,
    ]);
  });
});

describe('its physics', () => {
  // Neamen, Semiconductor Physics and Devices, MOS chapter example, from memory: p-Si, N_a 1e16,
  // ε_r 11.7, band bending 2 × 0.347 V: 0.30 µm to two digits.
  it('takes the depletion width of the abrupt approximation', () => {
    const wafer = waferOf('hx204');
    const silicon = { ...wafer, dopingPerCm3: 1e16, stack: { ...wafer.stack, permittivity: 11.7 } };
    expect(Math.abs(edgeDepthNm(silicon, 0.694) - 300)).toBeLessThan(5);
  });

  // Ten times the doping, about a third of the width: common practice, and the abrupt approximation.
  it('makes the edge shallower with the doping', () => {
    const wafer = waferOf('nb31-oxidised');
    const ratio =
      edgeDepthNm({ ...wafer, dopingPerCm3: 10 * wafer.dopingPerCm3 }, 0.1) /
      edgeDepthNm(wafer, 0.1);
    expect(ratio).toBeCloseTo(1 / Math.sqrt(10), 12);
  });

  // Five σ and p above 1e-4: seven fits fail by chance once in some thousand seeds.
  it.each(demo.fits.map((one) => [one.key, one] as const))(
    '%s finds the edge that was put in',
    (_, demoFit) => {
      const answer = answerOf(demoFit);
      const state = SCAN_STATES.find(({ key }) => key === demoFit.scanKey);
      const wafer = waferOf(byKey(demo.scans, demoFit.scanKey).sampleKey);
      const truth = edgeDepthNm(wafer, wafer.bendingV * (state?.bendingFactor ?? Number.NaN));
      const edge = answer.parameters.find(({ name }) => name === 'edgeDepthNm');
      const [low, high] = edge?.interval68 ?? [null, null];
      if (!edge || low === null || high === null) throw new Error('the edge has no interval');
      expect(Math.abs(edge.value - truth)).toBeLessThan(2.5 * (high - low));
      expect(answer.pValue).toBeGreaterThan(1e-4);
    },
  );
});
