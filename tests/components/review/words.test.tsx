import { describe, expect, it } from 'vitest';

import { checkSummary } from '@/components/review/check-list';
import { commentTargets, litEnergyKeV, targetAnchor } from '@/components/review/comment-targets';
import { edgeCaption } from '@/components/review/edge-answer';
import { parameterText } from '@/components/review/parameter-value';
import { parameterLabel } from '@/components/review/parameter-words';
import { submittedAt } from '@/components/review/review-queue';
import { waitingWords } from '@/components/review/waiting-words';
import { captureScaleError, scaleErrorOf } from '@/components/review/scale-error';
import { thinRidge } from '@/components/review/thin-ridge';
import { commentFitSchema } from '@/lib/schemas/fit';

import { makeFit, makeParameter } from './make-fit';

describe('a fitted value in words', () => {
  const edge = (changes: Parameters<typeof makeParameter>[3]) =>
    makeParameter('edgeDepthNm', 78.41, 2, changes);

  it('gives both sides where both are closed', () => {
    expect(parameterText(edge({ interval68: [76.52, 80.49] }), 'nm')).toBe('78.4 +2.1 −1.9 nm');
  });

  it('gives only a limit where one side is open', () => {
    const open = edge({ interval68: [112, null], interval95: [104, null], sigma: null });
    expect(parameterText(open, 'nm')).toBe('deeper than 104 nm (95 %)');
  });

  it('gives only a limit where the value sits on its bound', () => {
    const zero = makeParameter('edgeWidthNm', 0, 3, {
      interval68: [0, 4],
      interval95: [0, 9],
      atBound: 'lower',
    });
    expect(parameterText(zero, 'nm')).toBe('narrower than 9.00 nm (95 %)');
  });

  it('says that a held value was held', () => {
    expect(parameterText(edge({ held: true, value: 80 }), 'nm')).toBe('80 nm (held)');
    expect(edgeCaption(edge({ held: true }), 'depletion')).toBe('depletion ends, held');
  });

  it('names the populated side by the polarity', () => {
    const depleted = makeFit();
    const accumulated = makeFit({ spec: { polarity: 'accumulation' } });
    expect(parameterLabel('levelTop', depleted)).toBe('Fraction, depleted (surface side)');
    expect(parameterLabel('levelTop', accumulated)).toBe('Fraction, populated (surface side)');
  });
});

describe('waiting', () => {
  const now = new Date('2026-03-10T12:00:00Z');
  it.each([
    ['2026-03-10T11:30:00Z', 'under an hour'],
    ['2026-03-10T10:59:00Z', '1 hour'],
    ['2026-03-09T12:00:00Z', '24 hours'],
    ['2026-03-07T11:00:00Z', '3 days'],
  ])('since %s', (since, words) => {
    expect(waitingWords(since, now)).toBe(words);
  });

  it('counts from the last time that it was sent', () => {
    const event = (at: string) => ({
      id: '00000000-0000-4000-8000-000000000077',
      kind: 'submitted' as const,
      body: '',
      target: '',
      person: 'Ana',
      at,
    });
    const fit = makeFit({ events: [event('2026-03-02T09:00:00Z'), event('2026-03-05T09:00:00Z')] });
    expect(submittedAt(fit)).toBe('2026-03-05T09:00:00Z');
    expect(submittedAt(makeFit())).toBe('2026-03-01T09:00:00.000Z');
  });
});

describe('what a comment may point at', () => {
  const fit = makeFit();
  const groups = commentTargets(fit);
  const values = groups.flatMap((group) => group.targets.map((target) => target.value));

  it('offers points, depths within reach with the edge, and checks', () => {
    expect(groups.map((group) => group.label)).toEqual(['Points', 'Depths', 'Checks']);
    expect(values).toContain('point 14 keV');
    expect(values).toContain('depth 78 nm');
    expect(values).toContain('depth 140 nm');
    expect(values).not.toContain('depth 160 nm');
    expect(values).toContain('check edge-inside-reach');
  });

  it('offers nothing that the server would refuse', () => {
    for (const target of values) {
      expect(commentFitSchema.safeParse({ id: fit.id, body: 'why?', target }).success).toBe(true);
    }
  });

  it('leads to the place on the page', () => {
    expect(targetAnchor('check edge-inside-reach')).toBe('#check-edge-inside-reach');
    expect(targetAnchor('point 14 keV')).toBe('?about=point%2014%20keV#scan');
    expect(targetAnchor('depth 80 nm')).toBe('#depth');
    expect(targetAnchor('')).toBeNull();
  });
});

it('reads from the address which point to light', () => {
  expect(litEnergyKeV('point 14 keV')).toBe(14);
  expect(litEnergyKeV('point 2.5 keV')).toBe(2.5);
  expect([undefined, '', 'depth 80 nm', 'point x keV', ['point 2 keV']].map(litEnergyKeV)).toEqual(
    Array(5).fill(null),
  );
});

describe('an uncertainty that moves the whole profile', () => {
  it('is the bulk concentration for a fraction', () => {
    // 4e14 of 1.1e16 is 3.6 %.
    expect(scaleErrorOf(makeFit().spec)?.sentence).toBe(
      'Besides the bands, the uncertainty of the bulk concentration (±4 %) moves the whole profile.',
    );
    expect(captureScaleError(makeFit().spec)).toBeNull();
  });

  it('is the capture coefficient for a rate, and nothing where it has no σ', () => {
    const rate = (gammaSigmaCm3PerS: number | null) =>
      makeFit({
        spec: {
          response: {
            kind: 'capture-rate',
            gammaCm3PerS: 1e-6,
            gammaSigmaCm3PerS,
            baselinePerUs: 0,
          },
        },
      }).spec;
    expect(captureScaleError(rate(2e-7))).toBeCloseTo(0.2, 12);
    expect(scaleErrorOf(rate(null))).toBeNull();
  });
});

it('sums up checks', () => {
  const check = (state: 'fine' | 'caution' | 'problem') => ({ id: state, state, message: '' });
  expect(checkSummary([check('fine')])).toBe('all fine');
  expect(checkSummary([check('caution'), check('caution'), check('problem')])).toBe(
    '1 problem, 2 cautions',
  );
});

describe('thinning a stopping profile', () => {
  const bins = 1003;
  const ridge = {
    energyKeV: 8,
    edgesNm: Float64Array.from({ length: bins + 1 }, (_, i) => i * 0.5),
    mass: Float64Array.from({ length: bins }, (_, i) => (i + 1) / ((bins * (bins + 1)) / 2)),
  };

  it('keeps the mass, the ends and the order of the edges', () => {
    const thin = thinRidge(ridge, 200);
    const edges = Array.from(thin.edgesNm);
    expect(thin.mass.length).toBe(200);
    // Sums of the same numbers in another order: equal to rounding.
    expect(Array.from(thin.mass).reduce((a, b) => a + b, 0)).toBeCloseTo(1, 12);
    expect([edges[0], edges.at(-1)]).toEqual([0, 501.5]);
    expect(edges.every((edge, i) => i === 0 || edge > edges[i - 1]!)).toBe(true);
  });

  it('leaves a small profile as it is', () => {
    expect(Array.from(thinRidge(ridge, 2000).mass)).toEqual(Array.from(ridge.mass));
  });
});
