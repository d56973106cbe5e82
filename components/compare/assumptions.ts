import { asEntered, withSigma } from '@/lib/format';
import type { Fit } from '@/lib/schemas/fit';

import { PARAMETER_ORDER } from '@/components/review/parameter-words';

import { energyList, usedEnergiesKeV } from './comparability';
import { settingIdentity } from './same-model';

type ParameterName = (typeof PARAMETER_ORDER)[number];

/** One thing that a fit takes for granted, said for each of the fits. */
export interface AssumptionRow {
  label: string;
  values: string[];
  differs: boolean;
}

/** Everything that the fits assume, in the order of the fit desk, with a mark where they part. */
export function assumptionRows(fits: readonly Fit[]): AssumptionRow[] {
  return [...modelRows(fits), ...parameterRows(fits), bandsRow(fits)];
}

/** The model and the data: everything but the parameters and the resamples. */
export function modelRows(fits: readonly Fit[]): AssumptionRow[] {
  return [
    row('Trial profile', fits, (fit) => `${fit.spec.profile} edge`),
    row('Carriers near the surface', fits, (fit) =>
      fit.spec.polarity === 'depletion' ? 'few (depletion)' : 'many (accumulation)',
    ),
    row('Response', fits, responseWords),
    row('Bulk concentration', fits, bulkWords),
    row('Concentration on the surface side', fits, topWords),
    row('Cap layer', fits, (fit) =>
      fit.spec.capThicknessNm > 0 ? `${asEntered(fit.spec.capThicknessNm)} nm` : 'none',
    ),
    row(
      'Stopping set',
      fits,
      (fit) => fit.stoppingSetName,
      (fit) => fit.hashes.stoppingSet,
    ),
    row(
      'Points as frozen',
      fits,
      (fit) => `${fit.points.length} points`,
      (fit) => fit.hashes.points,
    ),
    row('Points switched off', fits, switchedOffWords),
  ];
}

function parameterRows(fits: readonly Fit[]): AssumptionRow[] {
  return PARAMETER_ORDER.filter((name) => isTold(name, fits)).map((name) =>
    row(
      settingLabel(name),
      fits,
      (fit) => settingWords(fit, name),
      (fit) => settingIdentity(fit.spec, name),
    ),
  );
}

export function bandsRow(fits: readonly Fit[]): AssumptionRow {
  return row('Bands', fits, ({ spec: { resamples, seed } }) =>
    resamples > 0
      ? `${resamples.toLocaleString('en')} resamples, seed ${seed}`
      : 'linear, no resamples',
  );
}

/** Two values count as different by `identity` where the words alone could hide it, such as two sets of one name. */
function row(
  label: string,
  fits: readonly Fit[],
  words: (fit: Fit) => string,
  identity: (fit: Fit) => string = words,
): AssumptionRow {
  const identities = fits.map(identity);
  const differs = new Set(identities).size > 1;
  const values = fits.map(words);
  const hidden = differs && new Set(values).size === 1;
  return {
    label,
    values: hidden
      ? values.map((value, index) => `${value} (${identities[index]?.slice(0, 8)})`)
      : values,
    differs,
  };
}

function responseWords({ spec: { response } }: Fit): string {
  if (response.kind === 'two-level') return 'two-level fraction';
  const gamma = withSigma(response.gammaCm3PerS, response.gammaSigmaCm3PerS);
  return `capture rate, γ ${gamma} cm³ s⁻¹, Λ₀ ${asEntered(response.baselinePerUs)} µs⁻¹`;
}

function bulkWords({ spec: { carriers }, observable }: Fit): string {
  if (carriers.bulkPerCm3 === null)
    return observable === 'rate' ? 'from the rate' : 'not given: populated share';
  return `${withSigma(carriers.bulkPerCm3, carriers.bulkSigmaPerCm3)} cm⁻³`;
}

function topWords({ spec: { carriers } }: Fit): string {
  return carriers.topPerCm3 === null ? 'not given' : `${asEntered(carriers.topPerCm3)} cm⁻³`;
}

function switchedOffWords(fit: Fit): string {
  const used = new Set(usedEnergiesKeV(fit));
  return energyList(
    fit.points.map((point) => point.energyKeV).filter((energy) => !used.has(energy)),
  );
}

/** Parameters of profiles that neither a sharp nor a graded edge has. */
const OF_OTHER_PROFILES: readonly ParameterName[] = [
  'layerThicknessNm',
  'farEdgeWidthNm',
  'surfacePotentialEv',
  'bulkPerCm3',
];

/** A width is told only where two graded fits could differ in it; a cap level only where there is a cap. */
function isTold(name: ParameterName, fits: readonly Fit[]): boolean {
  if (name === 'edgeWidthNm') return fits.some((fit) => fit.spec.profile === 'graded');
  if (name === 'levelCap') return fits.some((fit) => fit.spec.capThicknessNm > 0);
  if (OF_OTHER_PROFILES.includes(name))
    return fits.some((fit) => fit.spec.parameters[name] !== undefined);
  return true;
}

export function settingLabel(name: ParameterName): string {
  const words: Record<ParameterName, string> = {
    edgeDepthNm: 'Edge depth',
    edgeWidthNm: 'Edge width (σ)',
    layerThicknessNm: 'Layer thickness',
    farEdgeWidthNm: 'Far edge width (σ)',
    surfacePotentialEv: 'Band bending at the surface',
    bulkPerCm3: 'Bulk concentration',
    levelTop: 'Level on the surface side',
    levelBulk: 'Level in the bulk',
    levelCap: 'Level in the cap',
    depthScale: 'Depth scale',
  };
  return words[name];
}

/** "free", "free, prior 0.32(2) (bulk run)" or "held at 1 (…)", with the origin where it is given. */
function settingWords(fit: Fit, name: ParameterName): string {
  if (name === 'edgeWidthNm' && fit.spec.profile === 'sharp') return 'zero, as the edge is sharp';
  if (name === 'levelCap' && fit.spec.capThicknessNm === 0) return 'no cap';
  const setting = fit.spec.parameters[name];
  if (!setting) return name === 'depthScale' ? 'held at 1' : 'free';
  const origin = setting.origin === '' ? '' : ` (${setting.origin})`;
  if (setting.held) return `held at ${asEntered(setting.value ?? 1)}${origin}`;
  return setting.prior
    ? `free, prior ${asEntered(setting.prior.mean)} ± ${asEntered(setting.prior.sigma)}${origin}`
    : 'free';
}
