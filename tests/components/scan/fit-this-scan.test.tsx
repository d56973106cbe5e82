import { render, screen } from '@testing-library/react';
import { expect, it } from 'vitest';

import { FitThisScan } from '@/components/scan/fit-this-scan';
import type { StoppingSetRow } from '@/lib/schemas/stopping-set';

const set = (id: string, name: string, energiesKeV: number[]): StoppingSetRow => ({
  id,
  name,
  layerStack: 'SiC',
  origin: '',
  notes: '',
  energiesKeV,
  bins: 320,
  sha256: 'ab',
  invented: false,
  archivedAt: null,
  createdAt: '2026-03-01T10:00:00Z',
  createdBy: 'Ada',
});

it('leads to the stopping sets when there is none', () => {
  render(<FitThisScan scanId="s" energiesKeV={[2]} sets={[]} />);
  expect(screen.getByRole('link', { name: 'Add a stopping set' }).getAttribute('href')).toBe(
    '/stopping/new',
  );
});

it('says of each set which energies of the scan it does not hold', () => {
  const sets = [
    set('a', 'wide', [1, 30]),
    set('b', 'narrow', [2, 8]),
    set('c', 'narrower', [3, 8]),
  ];
  render(<FitThisScan scanId="s" energiesKeV={[2, 8, 22]} sets={sets} />);
  expect(screen.getAllByRole('option').map((option) => option.textContent)).toEqual([
    'wide',
    'narrow (does not hold 22 keV)',
    'narrower (does not hold 2 of the energies)',
  ]);
});
