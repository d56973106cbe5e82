import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import {
  freeFormAt,
  prepareFreeForm,
  type FreeFormInput,
  type Monotonic,
} from '@/lib/inversion/index';
import { heldAt, rateInput } from '../support/scans';
import { largestDifference } from './support/compare';

interface ScipyCase {
  shape: string;
  order: 1 | 2;
  monotonic: Monotonic;
  capNm: number;
  depthScale: number;
  baselinePerUs: number;
  values: number[];
  sigmas: number[];
  covariance: number[][] | null;
  reference: number[] | null;
  results: { strength: number; u: number[]; bvls: number[] }[];
}

/**
 * Source: scipy.optimize.nnls and lsq_linear (bvls) on the stacked system, with folds, differences and whitening of their own
 * (tests/reference/free-form.py; versions in the file). The two agree with each other to 1e-12 of the largest value.
 */
const { cases } = JSON.parse(readFileSync('fixtures/reference/free-form/scipy.json', 'utf8')) as {
  cases: ScipyCase[];
};

function inputOf(reference: ScipyCase): FreeFormInput {
  const template = rateInput({
    capThicknessNm: reference.capNm,
    parameters: { depthScale: heldAt(reference.depthScale) },
  });
  return {
    ...template,
    response: {
      kind: 'capture-rate',
      gammaCm3PerS: 1e-6,
      gammaSigmaCm3PerS: null,
      baselinePerUs: reference.baselinePerUs,
    },
    points: template.points.map((point, i) => ({
      ...point,
      value: reference.values[i]!,
      sigma: reference.sigmas[i]!,
    })),
    covariance: reference.covariance,
    difference: reference.order,
    monotonic: reference.monotonic,
    reference: reference.reference,
  };
}

describe('the constrained free-form profile', () => {
  // 6e-11 of the largest value was seen.
  it.each(
    cases.map((reference, k) => ({
      title: `${k}: ${reference.shape}, order ${reference.order}, monotonic ${reference.monotonic}, cap ${reference.capNm} nm`,
      reference,
    })),
  )('is that of SciPy: $title', ({ reference }) => {
    const prepared = prepareFreeForm(inputOf(reference));
    for (const { strength, u, bvls } of reference.results) {
      const solution = freeFormAt(prepared, strength);
      const found = [...solution.unknowns, ...(reference.capNm > 0 ? [solution.levelCap!] : [])];
      expect(solution.status).toBe('solved');
      expect(largestDifference(found, u)).toBeLessThan(1e-8);
      expect(largestDifference(found, bvls)).toBeLessThan(1e-8);
      expect(solution.values[20]!).toBeCloseTo(u[20]! * 1e12, -3);
    }
  });
});
