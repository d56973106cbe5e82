import { configure, fireEvent, render, screen } from '@testing-library/react';
import { SWRConfig } from 'swr';
import { afterEach, beforeEach, expect, it, vi } from 'vitest';

import { StoredProfiles } from '@/components/stopping/stored-profiles';

// Several checks may share two cores; waiting longer hides nothing.
configure({ asyncUtilTimeout: 15_000 });

const ID = '7d1f5b0e-58c3-4f0a-9a8e-6f0f4c0a1b2c';
const SET = {
  id: ID,
  name: 'SiC',
  layerStack: 'SiC',
  origin: '',
  notes: '',
  energiesKeV: [2],
  bins: 2,
  sha256: 'ab',
  invented: false,
  archivedAt: null,
  createdAt: '2026-03-01T10:00:00Z',
  createdBy: 'Ada',
  warnings: ['2keV.txt: the depths may end too early.'],
  files: [],
  // Two bins of 10 nm with masses ¾ and ¼: mean ¾·5 + ¼·15 = 7.5 nm by hand.
  profiles: [{ energyKeV: 2, edgesNm: [0, 10, 20], mass: [0.75, 0.25], lostShare: 0.05 }],
};
let answer: () => Response;

beforeEach(() => {
  // jsdom has no layout and so no ResizeObserver; nothing is drawn then.
  vi.stubGlobal(
    'ResizeObserver',
    class {
      observe() {}
      disconnect() {}
    },
  );
  vi.stubGlobal('fetch', () => Promise.resolve(answer()));
});
afterEach(() => vi.unstubAllGlobals());

const show = () =>
  render(
    <SWRConfig value={{ provider: () => new Map(), shouldRetryOnError: false }}>
      <StoredProfiles setId={ID} energies={1} />
    </SWRConfig>,
  );

it('shows moments, stored cautions and the loss', async () => {
  answer = () => Response.json(SET);
  show();
  expect(screen.getByRole('status').textContent).toContain('Loading the profiles');
  expect(await screen.findByText('7.5')).toBeDefined();
  expect(screen.getByText(/the depths may end too early/)).toBeDefined();
  expect(screen.getByText(/At 2 keV 5\.0 % of the muons did not stop/)).toBeDefined();
});

it('says why it could not load, and loads when asked again', async () => {
  answer = () =>
    Response.json({ error: { code: 'unexpected', message: 'The disk is full.' } }, { status: 500 });
  show();
  expect(await screen.findByText(/The disk is full/)).toBeDefined();
  answer = () => Response.json(SET);
  fireEvent.click(screen.getByRole('button', { name: 'Try again' }));
  expect(await screen.findByText('7.5')).toBeDefined();
});
