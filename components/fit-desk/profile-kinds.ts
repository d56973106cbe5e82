import type * as inversion from '@/lib/inversion/index';
import type { ProfileKind } from '@/lib/schemas/fit';

/** The trial profiles that the desk offers; a new one is one entry here. */
export const PROFILE_KINDS: readonly {
  kind: ProfileKind;
  label: string;
  short: string;
  says: string;
}[] = [
  {
    kind: 'sharp',
    label: 'Sharp edge',
    short: 'sharp',
    says: 'The carriers begin at one depth, without a transition.',
  },
  {
    kind: 'graded',
    label: 'Graded edge',
    short: 'graded',
    says: 'The carriers set in over a Gaussian width round one depth.',
  },
];

/** The entry of a kind; the desk makes no fits of kinds that it does not offer. */
export function profileKind(kind: inversion.ProfileKind) {
  return PROFILE_KINDS.find((entry) => entry.kind === kind) ?? PROFILE_KINDS[0]!;
}
