import { generateDemo } from '@/db/demo/generate';
import type { DemoData } from '@/db/demo/types';
import { listFits } from '@/db/access/fit/list-fits';
import { readFit } from '@/db/access/fit/read-fit';
import { readFile } from '@/db/access/file/read-file';
import { signIn } from '@/db/access/person/sign-in';
import { listIssuedProfiles } from '@/db/access/profile/list-issued-profiles';
import { listScans } from '@/db/access/scan/list-scans';
import { readTeam } from '@/db/access/team/read-team';
import { DEMO_PASSWORD } from '@/db/seeding/demo-password';
import { demoState, removeUnfinished } from '@/db/seeding/demo-state';
import { seedDemo } from '@/db/seeding/seed-demo';
import { users } from '@/db/schema/users';
import { teams } from '@/db/schema/teams';
import { beforeAll, describe, expect, it } from 'vitest';

import { testDatabase } from '../support/database';
import { personWithTeam } from '../support/people';

/** The demo as it ships, but for the number of resamples. */
function quickDemo(): DemoData {
  const demo = generateDemo(1);
  const fits = demo.fits.map((fit) => ({ ...fit, spec: { ...fit.spec, resamples: 10 } }));
  return { ...demo, fits };
}

describe('the demo team', async () => {
  const database = await testDatabase();
  const demo = quickDemo();

  beforeAll(async () => {
    await personWithTeam(database, 'Someone else');
    await seedDemo(database, demo);
  });

  const as = async (role: string) => {
    const email = demo.people.find((person) => person.role === role)?.email;
    const { sessionToken } = await signIn(await database.context(), {
      email,
      password: DEMO_PASSWORD,
    });
    return database.context(sessionToken);
  };

  it('lets each of its four people in with their role', async () => {
    for (const role of ['owner', 'analyst', 'reviewer', 'modeller'])
      expect((await as(role)).viewer).toMatchObject({ role, invented: true });
    expect((await readTeam(await as('owner'), {})).people).toHaveLength(4);
  });

  it('has two issued profiles, one fit in review with a thread and one returned', async () => {
    const ctx = await as('modeller');
    const profiles = await listIssuedProfiles(ctx, {});
    expect(profiles).toHaveLength(2);
    const fits = await listFits(ctx, {});
    const inState = (state: string) => fits.filter((fit) => fit.state === state);
    expect(inState('accepted')).toHaveLength(2);
    expect(inState('submitted')).toHaveLength(1);
    expect(inState('returned')).toHaveLength(1);
    const thread = await readFit(ctx, { id: inState('submitted')[0]?.id });
    expect(thread.events.filter(({ kind }) => kind === 'comment').length).toBeGreaterThan(1);
    for (const row of [...fits, ...profiles]) expect(row.invented).toBe(true);
  });

  it('keeps real files behind its scans', async () => {
    const ctx = await as('analyst');
    const scans = await listScans(ctx, {});
    expect(scans).toHaveLength(demo.scans.length);
    for (const scan of scans) {
      expect(scan.invented).toBe(true);
      const file = await readFile(ctx, { id: scan.file?.id });
      const original = demo.scans.find(({ file: { fileName } }) => fileName === file.name);
      expect(new TextDecoder().decode(file.bytes)).toBe(original?.file.text);
    }
  });

  it('is known as finished, and an interrupted seeding is taken away before the next', async () => {
    expect(await demoState(database.db, demo)).toBe('finished');
    await removeUnfinished(database.db, demo);
    expect(await demoState(database.db, demo)).toBe('finished');

    await database.db.update(teams).set({ invented: false });
    expect(await demoState(database.db, demo)).toBe('unfinished');
    await removeUnfinished(database.db, demo);
    expect(await demoState(database.db, demo)).toBe('absent');
    expect(await database.db.$count(users)).toBe(1);
  });
});
