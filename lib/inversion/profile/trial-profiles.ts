import { InversionError } from '../errors';
import type { FitInput, ProfileKind } from '../types';
import { bandBending } from './band-bending';
import { gradedEdge } from './graded-edge';
import { layer } from './layer';
import { sharpEdge } from './sharp-edge';
import type { TrialProfile } from './trial-profile';

const TRIAL_PROFILES: Readonly<
  Record<ProfileKind, (deepestNm: number, input: FitInput) => TrialProfile>
> = {
  sharp: sharpEdge,
  graded: gradedEdge,
  layer,
  'band-bending': bandBending,
};

/**
 * The trial profile that a fit asks for.
 *
 * @param deepestNm deepest depth below the cap where a point in use has stops.
 * @throws InversionError for a kind that does not exist, or what a profile needs and the input lacks.
 */
export function trialProfileOf(input: FitInput, deepestNm: number): TrialProfile {
  const make = TRIAL_PROFILES[input.profile] as (typeof TRIAL_PROFILES)[ProfileKind] | undefined;
  if (!make) {
    throw new InversionError('unknown-profile', `There is no trial profile "${input.profile}".`);
  }
  return make(deepestNm, input);
}
