import type { ProfileKind } from '../types';
import { gradedEdge } from './graded-edge';
import { sharpEdge } from './sharp-edge';
import type { TrialProfile } from './trial-profile';

export const TRIAL_PROFILES: Readonly<Record<ProfileKind, TrialProfile>> = {
  sharp: sharpEdge,
  graded: gradedEdge,
};
