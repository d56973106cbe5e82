import { readFit } from '@/db/access/fit/read-fit';
import { listFits } from '@/db/access/fit/list-fits';
import { saveFit } from '@/db/access/fit/save-fit';
import { editScan } from '@/db/access/scan/edit-scan';
import { createScan } from '@/db/access/scan/create-scan';
import { readScan } from '@/db/access/scan/read-scan';
import type { SaveFitInput } from '@/lib/schemas/fit';
import { beforeAll, describe, expect, it } from 'vitest';

import { honestFit, SCAN_META, testData, type TestData } from '../support/data';
import { testDatabase } from '../support/database';
import { personWithTeam, testTeam, type TestTeam } from '../support/people';

type Claim = SaveFitInput['claimed'];

/** Ten times the tolerance of 1e-6 that the product promises. */
const NUDGE = 1 + 1e-5;

describe('saving a fit', async () => {
  const database = await testDatabase();
  let team: TestTeam;
  let data: TestData;
  let honest: SaveFitInput;

  beforeAll(async () => {
    team = await testTeam(database);
    data = await testData(team.analyst);
    honest = await honestFit(team.analyst, data);
  });

  const save = async (input: SaveFitInput) => saveFit(await team.analyst.context(), input);

  const tampered: [string, RegExp, (claim: Claim) => void][] = [
    ['the edge', /: edgeDepthNm was given as/, (c) => (parameter(c, 'edgeDepthNm').value *= NUDGE)],
    ['σ of the edge', /σ of edgeDepthNm/, (c) => (parameter(c, 'edgeDepthNm').sigma! *= NUDGE)],
    [
      'an interval',
      /upper end of the 95 % interval of edgeDepthNm/,
      (c) => {
        const edge = parameter(c, 'edgeDepthNm');
        edge.interval95 = [edge.interval95[0], (edge.interval95[1] ?? 0) * NUDGE];
      },
    ],
    ['χ²', /χ² was given/, (c) => (c.answer.chiSquare -= 1e-3)],
    ['the p-value', /p-value/, (c) => (c.answer.pValue = 0.5)],
    ['degrees of freedom', /degrees of freedom/, (c) => (c.answer.degreesOfFreedom += 1)],
    ['AICc', /AICc/, (c) => (c.answer.aicc = c.answer.aicc! * NUDGE)],
    ['the status', /status/, (c) => (c.answer.status = 'stalled')],
    ['a prediction', /prediction at 8 keV/, (c) => (residual(c, 8).predicted *= NUDGE)],
    ['a measured value', /value at 8 keV/, (c) => (residual(c, 8).observed += 1e-4)],
    ['a point left out', /use of the point at 8 keV/, (c) => (residual(c, 8).enabled = false)],
    ['a point dropped', /number of residuals/, (c) => c.answer.residuals.pop()],
    [
      'a covariance',
      /covariance of edgeDepthNm and levelTop/,
      (c) => (matrixOf(c)[0]![matrixNames(c).indexOf('levelTop')]! += 1e-2),
    ],
    ['a profile value', /value at depth/, (c) => (c.profile.points.at(-1)!.value *= NUDGE)],
    ['a band', /lower95 at depth/, (c) => (c.profile.points.at(-1)!.lower95! *= NUDGE)],
    ['a flag', /flag at depth/, (c) => (c.profile.points.at(-1)!.flag = 'supported')],
    ['the reach', /reach/, (c) => (c.profile.reachNm *= 2)],
    ['the kind of bands', /(lower|upper)(68|95) at depth/, (c) => (c.profile.bands = 'delta')],
    ['the depths', /depths do not run/, (c) => c.profile.points.splice(50)],
  ];

  it.each(tampered)('refuses %s when it is altered, and says which', async (_, words, alter) => {
    const input = structuredClone(honest);
    alter(input.claimed);
    await expect(save(input)).rejects.toMatchObject({
      code: 'invalid',
      message: expect.stringMatching(words),
    });
    expect(await listFits(await team.analyst.context(), {})).toHaveLength(0);
  });

  it('names the claimed and the computed number', async () => {
    const input = structuredClone(honest);
    const { value } = parameter(input.claimed, 'edgeDepthNm');
    parameter(input.claimed, 'edgeDepthNm').value = 12;
    await expect(save(input)).rejects.toThrow(`given as 12, but the stored inputs give ${value}`);
  });

  it('refuses a fit of other settings than those sent', async () => {
    const spec = { ...honest.spec, seed: honest.spec.seed + 1 };
    await expect(save({ ...honest, spec })).rejects.toThrow(/(lower|upper)(68|95) at depth/);
    const held = { held: true, value: 1.02, prior: null, origin: '' };
    const stretched = { ...honest.spec, parameters: { depthScale: held } };
    await expect(save({ ...honest, spec: stretched })).rejects.toMatchObject({ code: 'invalid' });
  });

  it('refuses inputs that no fit can start from, in words', async () => {
    const spec = { ...honest.spec, switchedOffKeV: [2, 4, 6, 8, 10, 12, 14] };
    await expect(save({ ...honest, spec })).rejects.toThrow(/4 free parameters but only 2 points/);
    const absent = { ...honest.spec, switchedOffKeV: [3.3] };
    await expect(save({ ...honest, spec: absent })).rejects.toThrow('switches 3.3 keV off');
  });

  it('takes nothing of another team', async () => {
    const other = await personWithTeam(database, 'Other');
    const theirs = await testData(other);
    for (const input of [
      { ...honest, scanId: theirs.scanId },
      { ...honest, stoppingSetId: theirs.stoppingSetId },
      { ...honest, parentFitId: theirs.scanId },
    ])
      await expect(save(input)).rejects.toMatchObject({ code: 'not_found' });
  });

  it('keeps its own numbers, the points as they were, and says when the scan changed', async () => {
    const { id } = await save({ ...honest, parentFitId: null });
    const before = await readFit(await team.analyst.context(), { id });
    expect(before.scanChangedSince).toBe(false);
    expect(before.answer.chiSquare).toBe(honest.claimed.answer.chiSquare);

    const scan = await readScan(await team.analyst.context(), { id: data.scanId });
    const points = scan.points.map((point, index) => ({ ...point, enabled: index > 0 }));
    const edit = { id: data.scanId, meta: SCAN_META, points };
    await editScan(await team.analyst.context(), edit);
    const after = await readFit(await team.analyst.context(), { id });
    expect(after.scanChangedSince).toBe(true);
    expect(after.points).toEqual(before.points);
    await expect(save(honest)).rejects.toMatchObject({ code: 'invalid' });
  });

  it('refuses a scan that says nothing of the edge', async () => {
    const points = [2, 6, 10, 14, 18].map((energyKeV) => ({
      energyKeV,
      value: 0.5,
      sigma: 0.1,
      enabled: true,
      note: '',
    }));
    const flat = { sampleId: data.sampleId, meta: SCAN_META, source: { kind: 'typed', points } };
    const { id: scanId } = await createScan(await team.analyst.context(), flat);
    await expect(save({ ...honest, scanId })).rejects.toThrow('does not say where the edge is');
  });
});

function parameter(claim: Claim, name: string) {
  return claim.answer.parameters.find((one) => one.name === name)!;
}

function residual(claim: Claim, energyKeV: number) {
  return claim.answer.residuals.find((one) => one.energyKeV === energyKeV)!;
}

function matrixOf({ answer: { covariance } }: Claim): number[][] {
  if (!covariance.ok) throw new Error(covariance.reason);
  return covariance.matrix;
}

function matrixNames({ answer: { covariance } }: Claim): string[] {
  return covariance.ok ? covariance.names : [];
}
