import { describe, expect, it } from 'vitest';

import { assumptionRows } from '@/components/compare/assumptions';
import { comparability, energyList } from '@/components/compare/comparability';
import { differOnlyInWidth, nestedPairs, priorsDiffer } from '@/components/compare/same-model';

import { makeFit } from '../review/make-fit';

const differing = (fits: Parameters<typeof assumptionRows>[0]) =>
  assumptionRows(fits)
    .filter((row) => row.differs)
    .map((row) => row.label);

describe('assumptions', () => {
  it('finds nothing between two fits with the same inputs', () => {
    expect(differing([makeFit(), makeFit()])).toEqual([]);
  });

  it('names every setting in which two fits part', () => {
    const first = makeFit();
    const second = makeFit({
      hashes: { stoppingSet: 'd'.repeat(64) },
      spec: {
        profile: 'graded',
        polarity: 'accumulation',
        capThicknessNm: 25,
        switchedOffKeV: [14],
        seed: 7,
        carriers: { bulkPerCm3: null, bulkSigmaPerCm3: null, topPerCm3: 1e17 },
        parameters: {
          levelBulk: { held: true, value: 0.32, prior: null, origin: 'bulk run' },
          depthScale: { held: false, value: null, prior: { mean: 1, sigma: 0.03 }, origin: '' },
        },
      },
    });
    expect(differing([first, second])).toEqual([
      'Carriers near the surface',
      'Bulk concentration',
      'Concentration on the surface side',
      'Cap layer',
      'Stopping set',
      'Points switched off',
      'Level in the bulk',
      'Level in the cap',
      'Depth scale',
      'Bands',
    ]);
    const rows = assumptionRows([first, second]);
    const values = (label: string) => rows.find((row) => row.label === label)?.values;
    expect(values('Level in the bulk')).toEqual(['free', 'held at 0.32 (bulk run)']);
    expect(values('Depth scale')).toEqual(['held at 1', 'free, prior 1 ± 0.03']);
    expect(values('Points switched off')).toEqual(['none', '14 keV']);
    // Two sets of one name differ only by their content: the words must not hide it.
    expect(values('Stopping set')).toEqual([
      'Oxide on silicon carbide (bbbbbbbb)',
      'Oxide on silicon carbide (dddddddd)',
    ]);
  });

  it('tells held values apart that round alike', () => {
    const held = (value: number) =>
      makeFit({
        spec: { parameters: { levelTop: { held: true, value, prior: null, origin: '' } } },
      });
    expect(differing([held(0.74), held(0.740_000_1)])).toEqual(['Level on the surface side']);
  });
});

describe('nested models', () => {
  const sharp = makeFit({ spec: { profile: 'sharp' } });

  it('takes a sharp and a graded fit of the same inputs, whatever the seed of the bands', () => {
    const graded = makeFit({ spec: { profile: 'graded', seed: 99, resamples: 0 } });
    expect(differOnlyInWidth(sharp, graded)).toBe(true);
    expect(differOnlyInWidth(graded, sharp)).toBe(false);
    expect(nestedPairs([graded, sharp])).toEqual([{ sharp, graded }]);
  });

  it.each([
    ['polarity', makeFit({ spec: { polarity: 'accumulation' } })],
    ['points', makeFit({ hashes: { points: 'e'.repeat(64) } })],
    ['stopping set', makeFit({ hashes: { stoppingSet: 'e'.repeat(64) } })],
    ['switched-off points', makeFit({ spec: { switchedOffKeV: [2] } })],
    [
      'a held level',
      makeFit({
        spec: { parameters: { levelTop: { held: true, value: 0.7, prior: null, origin: '' } } },
      }),
    ],
    [
      'a held width',
      makeFit({
        spec: { parameters: { edgeWidthNm: { held: true, value: 5, prior: null, origin: '' } } },
      }),
    ],
  ])('refuses when %s differ', (_, graded) => {
    expect(differOnlyInWidth(sharp, graded)).toBe(false);
  });

  it('does not mind a drawn starting value of a free parameter', () => {
    const graded = makeFit({
      spec: { parameters: { levelTop: { held: false, value: 0.5, prior: null, origin: '' } } },
    });
    expect(differOnlyInWidth(sharp, graded)).toBe(true);
  });

  it('sees that priors differ', () => {
    const prior = {
      held: false,
      value: null,
      prior: { mean: 0.3, sigma: 0.02 },
      origin: 'bulk run',
    };
    expect(priorsDiffer([makeFit(), makeFit()])).toBe(false);
    expect(priorsDiffer([makeFit(), makeFit({ spec: { parameters: { levelBulk: prior } } })])).toBe(
      true,
    );
  });
});

describe('comparability', () => {
  it('takes fits of the same points', () => {
    expect(comparability([makeFit(), makeFit({ spec: { profile: 'sharp' } })])).toEqual({
      comparable: true,
    });
  });

  it('says which points only one of them uses', () => {
    const judged = comparability([
      makeFit({ name: 'All' }),
      makeFit({ name: 'Fewer', spec: { switchedOffKeV: [14, 18] } }),
    ]);
    expect(judged).toEqual({
      comparable: false,
      reason: 'Different points were switched on: “All” alone uses 14 and 18 keV.',
    });
  });

  it('says that the scan was edited between two fits', () => {
    const judged = comparability([
      makeFit({ name: 'Old' }),
      makeFit({ name: 'New', hashes: { points: 'f'.repeat(64) } }),
    ]);
    expect(judged).toEqual({
      comparable: false,
      reason: 'The scan was edited between “Old” and “New”: they hold different points.',
    });
  });

  it('lists energies as people say them', () => {
    expect([energyList([]), energyList([14]), energyList([2, 4.5, 14])]).toEqual([
      'none',
      '14 keV',
      '2, 4.5 and 14 keV',
    ]);
  });
});
