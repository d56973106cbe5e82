import { AGREEMENT_TOLERANCE } from '@/lib/inversion/index';

export type Shown = number | string | boolean | null;

/** One thing that is both claimed and computed. */
export interface Pair {
  /** Such as "σ of edgeDepthNm" or "upper95 at depth 40 nm". */
  what: string;
  claimed: Shown | undefined;
  recomputed: Shown | undefined;
  /** What counts as large for this number; differences are relative to it when it is larger. */
  scale?: number;
  /** What it is just above and just below the same depth; anything between is confirmed, too. */
  beside?: readonly Shown[];
}

export function agrees({ claimed, recomputed, scale = 0, beside = [] }: Pair): boolean {
  if (typeof claimed !== 'number' || typeof recomputed !== 'number')
    return claimed === recomputed || (claimed !== undefined && beside.includes(claimed));
  const near = [recomputed, ...beside.filter((value) => typeof value === 'number')];
  const size = Math.max(Math.abs(claimed), Math.abs(recomputed), scale);
  const slack = AGREEMENT_TOLERANCE * size;
  return claimed >= Math.min(...near) - slack && claimed <= Math.max(...near) + slack;
}

export function counted(
  what: string,
  claimed: readonly unknown[],
  recomputed: readonly unknown[],
): Pair {
  return { what, claimed: claimed.length, recomputed: recomputed.length };
}
