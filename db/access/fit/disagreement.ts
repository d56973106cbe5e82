import type { CarrierProfile, FitAnswer } from '@/lib/inversion/index';

import { answerPairs } from './answer-pairs';
import { agrees, type Pair, type Shown } from './pair';
import { profilePairs } from './profile-pairs';
import type { Recomputed } from './recompute';

export interface Claim {
  answer: FitAnswer;
  profile: CarrierProfile;
}

export interface Disagreement {
  what: string;
  claimed: Shown;
  recomputed: Shown;
}

/** The first number of a claimed answer that the recomputed one does not confirm, or null. */
export function firstDisagreement(claimed: Claim, recomputed: Recomputed): Disagreement | null {
  for (const pair of pairs(claimed, recomputed)) {
    if (agrees(pair)) continue;
    const { what, claimed: c = null, recomputed: r = null } = pair;
    return { what, claimed: c, recomputed: r };
  }
  return null;
}

function* pairs(claimed: Claim, recomputed: Recomputed): Generator<Pair> {
  yield* answerPairs(claimed.answer, recomputed.answer);
  yield* profilePairs(claimed.profile, recomputed);
}
