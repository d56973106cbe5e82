import { discardFit } from '@/db/access/fit/discard-fit';
import { readFit } from '@/db/access/fit/read-fit';
import { saveFit } from '@/db/access/fit/save-fit';
import { readHome } from '@/db/access/home/read-home';
import { acceptFit } from '@/db/access/review/accept-fit';
import { commentFit } from '@/db/access/review/comment-fit';
import { returnFit } from '@/db/access/review/return-fit';
import { submitFit } from '@/db/access/review/submit-fit';
import { beforeAll, describe, expect, it } from 'vitest';

import { honestFit, savedFit, testData, type TestData } from '../support/data';
import { testDatabase } from '../support/database';
import { testTeam, type TestPerson, type TestTeam } from '../support/people';

const FEW = { resamples: 10 };

describe('review', async () => {
  const database = await testDatabase();
  let team: TestTeam;
  let data: TestData;

  beforeAll(async () => {
    team = await testTeam(database);
    data = await testData(team.analyst);
  });

  async function submitted(by: TestPerson): Promise<string> {
    const id = await savedFit(by, data, FEW);
    await submitFit(await by.context(), { id, note: '' });
    return id;
  }

  it('lets nobody decide on a fit of their own, not even an owner', async () => {
    const id = await submitted(team.owner);
    const fit = await readFit(await team.owner.context(), { id });
    expect(fit.may).toMatchObject({ accept: false, return: false });
    await expect(acceptFit(await team.owner.context(), { id, note: '' })).rejects.toMatchObject({
      code: 'forbidden',
    });
    await expect(
      returnFit(await team.owner.context(), { id, reason: 'Mine.' }),
    ).rejects.toMatchObject({ code: 'forbidden' });
    await acceptFit(await team.reviewer.context(), { id, note: '' });
  });

  it('returns with a reason only, and a returned fit waits for its maker until it is revised', async () => {
    const id = await submitted(team.analyst);
    await expect(
      returnFit(await team.reviewer.context(), { id, reason: '  ' }),
    ).rejects.toMatchObject({ code: 'invalid', fields: { reason: expect.any(String) } });
    await returnFit(await team.reviewer.context(), { id, reason: 'Free the depth scale.' });
    const fit = await readFit(await team.analyst.context(), { id });
    expect(fit.state).toBe('returned');
    expect(fit.events.at(-1)).toMatchObject({ kind: 'returned', body: 'Free the depth scale.' });
    const waits = async () =>
      (await readHome(await team.analyst.context(), {})).waiting.map((one) => one.id);
    expect(await waits()).toContain(id);
    const revision = { ...(await honestFit(team.analyst, data, FEW)), parentFitId: id };
    await saveFit(await team.analyst.context(), revision);
    expect(await waits()).not.toContain(id);
  });

  it('moves a fit once from each state', async () => {
    const id = await submitted(team.analyst);
    await expect(submitFit(await team.analyst.context(), { id })).rejects.toMatchObject({
      code: 'conflict',
    });
    const decisions = await Promise.allSettled([
      acceptFit(await team.reviewer.context(), { id, note: '' }),
      returnFit(await team.owner.context(), { id, reason: 'No.' }),
      acceptFit(await team.owner.context(), { id, note: '' }),
    ]);
    expect(decisions.filter(({ status }) => status === 'fulfilled')).toHaveLength(1);
    const fit = await readFit(await team.owner.context(), { id });
    expect(fit.events.filter(({ kind }) => kind !== 'submitted')).toHaveLength(1);
  });

  it('numbers concurrent acceptances without gap or double', async () => {
    const ids = [];
    for (let i = 0; i < 6; i += 1) ids.push(await submitted(team.analyst));
    const issued = await Promise.all(
      ids.map(async (id, index) => {
        const judge = index % 2 === 0 ? team.reviewer : team.owner;
        return acceptFit(await judge.context(), { id, note: '' });
      }),
    );
    const sequence = issued.map(({ number }) => Number(number.split('-').at(-1))).sort(byValue);
    const first = sequence[0] ?? 0;
    expect(sequence).toEqual(ids.map((_, index) => first + index));
    expect(issued[0]?.number).toMatch(/^SL-\d{4}-\d{3}$/);
  });

  it('starts the numbers again in a new year, and for each team', async () => {
    const id = await submitted(team.analyst);
    const ctx = { ...(await team.reviewer.context()), now: new Date('2099-01-01T00:00:00Z') };
    expect((await acceptFit(ctx, { id, note: '' })).number).toBe('SL-2099-001');
    const others = await testTeam(database);
    const theirData = await testData(others.analyst);
    const theirs = await savedFit(others.analyst, theirData, FEW);
    await submitFit(await others.analyst.context(), { id: theirs });
    const theirCtx = { ...(await others.reviewer.context()), now: ctx.now };
    const issued = await acceptFit(theirCtx, { id: theirs, note: '' });
    expect(issued.number).toBe('SL-2099-001');
  });

  it('keeps comments with what they point at, and lets a modeller ask', async () => {
    const id = await submitted(team.analyst);
    const comment = { id, body: 'Is this point right?', target: 'point 12 keV' };
    await commentFit(await team.modeller.context(), comment);
    const fit = await readFit(await team.analyst.context(), { id });
    expect(fit.events.at(-1)).toMatchObject({
      kind: 'comment',
      body: 'Is this point right?',
      target: 'point 12 keV',
      person: 'The modeller',
    });
  });

  it('discards a draft for good, but nothing that was submitted or revised', async () => {
    const draft = await savedFit(team.analyst, data, FEW);
    await discardFit(await team.analyst.context(), { id: draft });
    await expect(readFit(await team.analyst.context(), { id: draft })).rejects.toMatchObject({
      code: 'not_found',
    });
    const sent = await submitted(team.analyst);
    await expect(discardFit(await team.analyst.context(), { id: sent })).rejects.toMatchObject({
      code: 'conflict',
    });
    const parent = await savedFit(team.analyst, data, FEW);
    const child = { ...(await honestFit(team.analyst, data, FEW)), parentFitId: parent };
    await saveFit(await team.analyst.context(), child);
    await expect(discardFit(await team.analyst.context(), { id: parent })).rejects.toMatchObject({
      code: 'conflict',
    });
  });
});

const byValue = (a: number, b: number) => a - b;
