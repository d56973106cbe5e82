import type { StoppingSet } from '../types';

/**
 * Work that depends on a stopping set and a few settings but on no datum, remembered as long as the set itself lives: a fit that is
 * made again after a point was switched off or a level held begins where the last one did.
 *
 * @param most results kept per set; the oldest goes first.
 */
export function rememberBySet<T>(
  most: number,
): (set: StoppingSet, key: string, make: () => T) => T {
  const bySet = new WeakMap<StoppingSet, Map<string, T>>();
  return (set, key, make) => {
    const known = bySet.get(set) ?? new Map<string, T>();
    bySet.set(set, known);
    const found = known.get(key);
    if (found !== undefined) return found;
    const made = make();
    if (known.size >= most) known.delete(known.keys().next().value!);
    known.set(key, made);
    return made;
  };
}
