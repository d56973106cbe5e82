import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';
import { xoroshiro128plusFromState } from 'pure-rand/generator/xoroshiro128plus';

/** Finaliser of MurmurHash3 (32 bit): a bijection that spreads neighbouring numbers apart. */
function scatter(value: number): number {
  let h = value | 0;
  h = Math.imul(h ^ (h >>> 16), 0x85ebca6b);
  h = Math.imul(h ^ (h >>> 13), 0xc2b2ae35);
  return h ^ (h >>> 16);
}

/**
 * Standard normal deviates of stream `stream` of a seed (xoroshiro128+, Box-Muller). The same (seed, stream) gives the same
 * numbers wherever it runs; streams of one seed never share a state.
 */
export function normalStream(seed: number, stream: number): () => number {
  const high = scatter(Math.floor(seed / 0x1_0000_0000) ^ 0x5bd1e995);
  const low = scatter((seed >>> 0) ^ high);
  const row = scatter(low + Math.imul(stream + 1, 0x9e3779b9));
  const generator = xoroshiro128plusFromState([
    low,
    row,
    scatter(row ^ 0x2545f491),
    scatter(low ^ row) | 1,
  ]);
  let spare = NaN;
  return () => {
    if (!Number.isNaN(spare)) {
      const value = spare;
      spare = NaN;
      return value;
    }
    const radius = Math.sqrt(-2 * Math.log(1 - uniformFloat64(generator)));
    const angle = 2 * Math.PI * uniformFloat64(generator);
    spare = radius * Math.sin(angle);
    return radius * Math.cos(angle);
  };
}
