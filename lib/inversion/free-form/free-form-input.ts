import { InversionError } from '../errors';
import { checkInput } from '../fit/check-input';
import type { FitInput } from '../types';
import { MAX_KNOTS } from './knots';

/** Which way the profile may go with depth: 'rising' never falls going deeper, 'falling' never rises. */
export type Monotonic = 'no' | 'rising' | 'falling';

/**
 * What a free-form profile depends on. Of `parameters` it reads levelTop and levelBulk (held; a capture rate needs neither),
 * levelCap (held, free, or with a prior, which counts as one more observation) and depthScale (held, or with its prior: then
 * the prior mean is used and its uncertainty enters the bands).
 */
export interface FreeFormInput extends Pick<
  FitInput,
  | 'observable'
  | 'points'
  | 'covariance'
  | 'stopping'
  | 'polarity'
  | 'response'
  | 'carriers'
  | 'capThicknessNm'
  | 'parameters'
> {
  /** Depths of the knots below the cap, nm, ascending; by default knotCount of them evenly spaced in √depth. */
  knotsNm?: readonly number[] | null;
  knotCount?: number;
  /** The penalty is on the first or the second difference of the unknown. */
  difference: 1 | 2;
  monotonic: Monotonic;
  /** u₀ per knot, in the unit of the unknown u: the penalty is then on L(u − u₀). Zero when left out. */
  reference?: readonly number[] | null;
}

/** @throws InversionError with one clear sentence for whatever a free-form profile cannot start from. */
export function checkFreeFormInput(input: FreeFormInput): void {
  checkInput({ ...input, profile: 'sharp' });
  if (input.difference !== 1 && input.difference !== 2) {
    throw new InversionError(
      'bad-difference',
      'The penalty is on the first or the second difference: 1 or 2.',
    );
  }
  if (!['no', 'rising', 'falling'].includes(input.monotonic)) {
    throw new InversionError(
      'bad-monotonic',
      "A free-form profile is 'rising', 'falling' or 'no' for neither.",
    );
  }
  if (!input.points.some(({ enabled }) => enabled))
    throw new InversionError('empty-scan', 'Every point of the energy scan is switched off.');
  checkKnots(input);
}

function checkKnots({ knotsNm, knotCount, difference }: FreeFormInput): void {
  const count = knotsNm ? knotsNm.length : (knotCount ?? 3);
  if (!(Number.isInteger(count) && count >= difference + 1 && count <= MAX_KNOTS)) {
    throw new InversionError(
      'bad-knot-count',
      `A free-form profile has ${difference + 1} to ${MAX_KNOTS} knots, not ${count}.`,
    );
  }
  knotsNm?.forEach((depth, j) => {
    if (!(depth >= 0 && Number.isFinite(depth) && (j === 0 || depth > knotsNm[j - 1]!))) {
      throw new InversionError(
        'bad-knots',
        `Knot ${j + 1} lies at ${depth} nm; knots are finite depths from 0 on, each deeper than the one before.`,
        { index: j },
      );
    }
  });
}

/** @throws InversionError 'bad-reference' unless there is one finite number per knot. */
export function checkReference(reference: readonly number[], knots: number): void {
  if (reference.length === knots && reference.every((value) => Number.isFinite(value))) return;
  throw new InversionError(
    'bad-reference',
    `The reference of the penalty needs one finite number for each of the ${knots} knots.`,
  );
}
