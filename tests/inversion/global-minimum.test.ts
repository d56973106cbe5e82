import { describe, expect, it } from 'vitest';
import { fit, prepareFit } from '@/lib/inversion/index';
import { bruteForce } from './support/brute-force';
import { randomScan, type RandomKind } from './support/random-scans';

/** First seed and number of scans; the study (tests/study/global-minimum.ts) runs 1,000. */
const SCANS: readonly { kind: RandomKind; first: number; count: number }[] = [
  { kind: 'edge', first: 0, count: 80 },
  { kind: 'layer', first: 450, count: 6 },
  { kind: 'band-bending', first: 750, count: 3 },
  { kind: 'saturating', first: 900, count: 4 },
];
/** χ² above brute force that is allowed. Why so small: a hundredth moves an interval by half a per cent of its width. */
const ALLOWED = 0.01;

describe('the global minimum', () => {
  // Source: brute force in support/brute-force.ts, which shares only the fold.
  it.each(SCANS)(
    `is never more than ${ALLOWED} above brute force over $count random scans: $kind`,
    ({ kind, first, count }) => {
      const above: { seed: number; excess: number }[] = [];
      let unusable = 0;
      for (let seed = first; seed < first + count; seed++) {
        const prepared = prepareFit(randomScan(kind, seed));
        const outcome = fit(prepared, { intervalsFor: [] });
        const brute = bruteForce(prepared);
        if (outcome.status === 'no-minimum') {
          unusable++;
          // The lattice of brute force is another one, so its spread may differ a little.
          expect(brute.spread, `seed ${seed}: ${outcome.reason}`).toBeLessThan(1.1);
          continue;
        }
        const excess = outcome.answer.chiSquare - brute.chiSquare;
        if (excess > ALLOWED) above.push({ seed, excess });
      }
      expect(above).toEqual([]);
      expect(unusable).toBeLessThanOrEqual(count / 4);
    },
  );
});
