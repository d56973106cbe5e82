import 'server-only';

import { generateDemo } from '@/db/demo/generate';

import { database } from './client';
import { migrate } from './migrate';
import { DEMO_PASSWORD } from './seeding/demo-password';
import { demoState, removeUnfinished } from './seeding/demo-state';
import { seedDemo } from './seeding/seed-demo';

const SEED = 20_260_203;

const { db, queue, close } = await database();
await migrate(db);
const demo = generateDemo(SEED);
const state = await demoState(db, demo);
if (state === 'unfinished') await removeUnfinished(db, demo);
if (state !== 'finished') await seedDemo({ db, queue }, demo);

const width = Math.max(...demo.people.map(({ email }) => email.length));
const lines = demo.people.map(
  ({ email, name, role }) => `  ${email.padEnd(width)}  ${role.padEnd(8)}  ${name}`,
);
console.log(
  [
    `Demo team ${demo.team.name} (${state === 'finished' ? 'was there already' : 'seeded'}; all data invented).`,
    `Sign in with the password ${DEMO_PASSWORD} as:`,
    ...lines,
  ].join('\n'),
);
close();
