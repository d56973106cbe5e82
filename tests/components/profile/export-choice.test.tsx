import { describe, expect, it } from 'vitest';

import { exportChoiceOf, exportPath, readStep } from '@/components/profile/export-choice';
import { exportPreview } from '@/components/profile/export-preview';
import { exportProfileSchema } from '@/lib/schemas/profile';

import { makeFit } from '../review/make-fit';

const ID = '00000000-0000-4000-8000-000000000001';
const defaults = { grid: 'fit', step: '1', depthUnit: 'nm', concentrationUnit: 'cm-3' } as const;

describe('the choice of an export', () => {
  it('comes from the address, and falls back where the address says nothing sensible', () => {
    expect(exportChoiceOf({})).toEqual(defaults);
    expect(
      exportChoiceOf({ grid: 'uniform', stepNm: '0.5', depthUnit: 'um', concentrationUnit: 'm-3' }),
    ).toEqual({ grid: 'uniform', step: '0.5', depthUnit: 'um', concentrationUnit: 'm-3' });
    expect(exportChoiceOf({ grid: 'hexagonal', depthUnit: ['nm', 'cm'] })).toEqual(defaults);
  });

  it('makes a query that the server reads as the same choice', () => {
    const path = exportPath(ID, { ...defaults, grid: 'uniform', step: ' 2,5 ', depthUnit: 'cm' });
    const query = Object.fromEntries(new URL(path, 'http://localhost').searchParams);
    expect(path.startsWith(`/api/profiles/${ID}/export?`)).toBe(true);
    expect(exportProfileSchema.parse({ ...query, id: ID })).toEqual({
      id: ID,
      grid: 'uniform',
      stepNm: 2.5,
      depthUnit: 'cm',
      concentrationUnit: 'cm-3',
    });
  });

  it('leaves the step out where it means nothing', () => {
    expect(exportPath(ID, { ...defaults, step: 'nonsense' })).not.toContain('stepNm');
  });
});

describe('the step', () => {
  it('counts the rows, the end included when it is a whole number of steps', () => {
    expect(readStep('0.1', 0.3, 100)).toEqual({ ok: true, stepNm: 0.1, rows: 4 });
    expect(readStep('50', 160, 100)).toEqual({ ok: true, stepNm: 50, rows: 4 });
  });

  it.each(['', 'abc', '0', '-1', '5000'])('refuses %j with a sentence', (step) => {
    const read = readStep(step, 160, 100);
    expect(read.ok).toBe(false);
    expect(read.ok ? '' : read.message).toMatch(/^Step: /);
  });

  it('refuses more rows than the server writes', () => {
    expect(readStep('0.01', 160, 100)).toEqual({
      ok: false,
      message: 'Step: 0.01 nm makes 16,001 rows; at most 100 are written. Choose a larger step.',
    });
  });
});

describe('the preview', () => {
  const { carrierProfile } = makeFit();

  it('shows the heading and the first rows of the fit grid as the file has them', () => {
    expect(exportPreview(carrierProfile, defaults, null, 3)).toEqual([
      'depth_nm,concentration_cm-3,lower68_cm-3,upper68_cm-3,lower95_cm-3,upper95_cm-3,flag',
      '0,0,0,100000000000000,0,200000000000000,below floor',
      '40,0,0,100000000000000,0,200000000000000,below floor',
      '80,11000000000000000,10000000000000000,11500000000000000,9000000000000000,12000000000000000,supported',
    ]);
  });

  it('converts units and interpolates a uniform grid', () => {
    const lines = exportPreview(
      carrierProfile,
      { ...defaults, grid: 'uniform', depthUnit: 'um', concentrationUnit: 'm-3' },
      60,
      2,
    );
    expect(lines[0]).toBe(
      'depth_um,concentration_m-3,lower68_m-3,upper68_m-3,lower95_m-3,upper95_m-3,flag',
    );
    // Half way between 40 nm (0 cm⁻³) and 80 nm (1.1e16 cm⁻³ = 1.1e22 m⁻³).
    expect(lines[2]?.split(',').slice(0, 2)).toEqual(['0.06', '5.5e+21']);
  });
});
