import type { Fit, FitSpec } from '@/lib/schemas/fit';

type ParameterName = keyof FitSpec['parameters'];

/**
 * What a setting does to the answer, as text that compares at full precision. A free
 * parameter's value is only where drawing starts; an origin is a remark. Missing means
 * free, and for the depth scale held at 1.
 */
export function settingIdentity(spec: FitSpec, name: ParameterName): string {
  if (name === 'edgeWidthNm' && spec.profile === 'sharp') return 'absent';
  if (name === 'levelCap' && spec.capThicknessNm === 0) return 'absent';
  const setting = spec.parameters[name];
  if (!setting) return name === 'depthScale' ? 'held 1' : 'free';
  if (setting.held) return `held ${setting.value ?? 1}`;
  return setting.prior ? `free ${setting.prior.mean} ${setting.prior.sigma}` : 'free';
}

const OTHER_THAN_WIDTH: readonly ParameterName[] = [
  'edgeDepthNm',
  'levelTop',
  'levelBulk',
  'levelCap',
  'depthScale',
];

/** Everything that moves the minimum, except the profile and its width. */
function modelApartFromWidth({ spec, hashes }: Fit): string {
  return JSON.stringify([
    hashes.points,
    hashes.stoppingSet,
    spec.polarity,
    spec.response,
    spec.capThicknessNm,
    spec.switchedOffKeV.toSorted((a, b) => a - b),
    OTHER_THAN_WIDTH.map((name) => settingIdentity(spec, name)),
  ]);
}

/** Whether the graded fit becomes the sharp one when its width is set to zero: the two are nested. */
export function differOnlyInWidth(sharp: Fit, graded: Fit): boolean {
  return (
    sharp.spec.profile === 'sharp' &&
    graded.spec.profile === 'graded' &&
    settingIdentity(graded.spec, 'edgeWidthNm') === 'free' &&
    modelApartFromWidth(sharp) === modelApartFromWidth(graded)
  );
}

/** Nested pairs among the fits, sharp first. */
export function nestedPairs(fits: readonly Fit[]): { sharp: Fit; graded: Fit }[] {
  return fits.flatMap((sharp) =>
    fits.filter((graded) => differOnlyInWidth(sharp, graded)).map((graded) => ({ sharp, graded })),
  );
}

/** Whether the priors of two fits differ; each prior adds its own term to χ². */
export function priorsDiffer(fits: readonly Fit[]): boolean {
  const priors = fits.map(({ spec }) =>
    JSON.stringify(
      Object.entries(spec.parameters)
        .filter(([, setting]) => setting && !setting.held && setting.prior)
        .map(([name, setting]) => [name, setting?.prior])
        .toSorted(([a], [b]) => String(a).localeCompare(String(b))),
    ),
  );
  return new Set(priors).size > 1;
}
