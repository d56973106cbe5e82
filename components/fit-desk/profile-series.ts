import type { ProfileSeries, ResidualSeries } from '@/components/charts/chart-types';
import type { CarrierProfile, FitAnswer, ProfileKind } from '@/lib/inversion/index';

import type { ComparedFit } from './comparison';
import { profileKind } from './profile-kinds';

/** The fit as a solid line first, the models it is compared with dashed after it. */
export function profileSeries(
  fit: { kind: ProfileKind; profile: CarrierProfile } | null,
  compared: readonly ComparedFit[],
): ProfileSeries[] {
  if (!fit) return [];
  const others = compared.filter(
    ({ kind, profile }) => kind !== fit.kind && profile.unit === fit.profile.unit,
  );
  return [
    { label: profileKind(fit.kind).short, style: 'solid', profile: fit.profile },
    ...others.map(({ kind, profile }) => ({
      label: profileKind(kind).short,
      style: 'dashed' as const,
      profile,
    })),
  ];
}

export function residualSeries(
  fit: { kind: ProfileKind; answer: FitAnswer } | null,
  compared: readonly ComparedFit[],
): ResidualSeries[] {
  if (!fit) return [];
  return [
    { label: profileKind(fit.kind).short, style: 'solid', residuals: fit.answer.residuals },
    ...compared
      .filter(({ kind }) => kind !== fit.kind)
      .map(({ kind, answer }) => ({
        label: profileKind(kind).short,
        style: 'dashed' as const,
        residuals: answer.residuals,
      })),
  ];
}

/** Relative uncertainty of the capture coefficient; null where it is not known or plays no part. */
export function scaleErrorOf(response: {
  kind: string;
  gammaCm3PerS?: number;
  gammaSigmaCm3PerS?: number | null;
}): number | null {
  if (response.kind !== 'capture-rate' || !response.gammaCm3PerS || !response.gammaSigmaCm3PerS)
    return null;
  return response.gammaSigmaCm3PerS / response.gammaCm3PerS;
}
