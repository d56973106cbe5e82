import { DEFAULT_RESAMPLES, DEPTH_SCALE_PRIOR, type ParameterName } from '@/lib/inversion/index';
import type { FitSpec, ProfileKind } from '@/lib/schemas/fit';
import type { Sample } from '@/lib/schemas/sample';
import type { Scan } from '@/lib/schemas/scan';

/** Everything on the left of the desk: the settings of a fit and the stopping set by id. */
export interface Assumptions extends FitSpec {
  stoppingSetId: string | null;
}

export type Setting = NonNullable<FitSpec['parameters'][ParameterName]>;

const DEFAULT_SEED = 1;
/** About 1 µs⁻¹ per 10¹² cm⁻³, the rule of thumb for holes in germanium near 200 K (common practice, no source). */
export const DEFAULT_GAMMA = 1e-6;

const FREE: Setting = { held: false, value: null, prior: null, origin: '' };
const SCALE_HELD: Setting = { held: true, value: 1, prior: null, origin: '' };

/** What a new fit of a scan assumes before anybody changes it; the scale of carriers comes from the sample's doping. */
export function defaultAssumptions(
  scan: Pick<Scan, 'observable'>,
  sample: Pick<Sample, 'dopingPerCm3' | 'dopingSigmaPerCm3' | 'capThicknessNm'>,
  stoppingSetId: string | null,
): Assumptions {
  const fraction = scan.observable === 'fraction';
  return {
    stoppingSetId,
    profile: 'graded',
    polarity: 'depletion',
    response: fraction
      ? { kind: 'two-level' }
      : {
          kind: 'capture-rate',
          gammaCm3PerS: DEFAULT_GAMMA,
          gammaSigmaCm3PerS: null,
          baselinePerUs: 0,
        },
    carriers: {
      bulkPerCm3: fraction ? sample.dopingPerCm3 : null,
      bulkSigmaPerCm3: fraction ? sample.dopingSigmaPerCm3 : null,
      topPerCm3: null,
    },
    capThicknessNm: sample.capThicknessNm ?? 0,
    parameters: {},
    switchedOffKeV: [],
    seed: DEFAULT_SEED,
    resamples: DEFAULT_RESAMPLES,
  };
}

/** Parameters of a trial profile, in the order of the table. */
export function parameterNames(profile: ProfileKind, capThicknessNm: number): ParameterName[] {
  return [
    'edgeDepthNm',
    ...(profile === 'graded' ? (['edgeWidthNm'] as const) : []),
    'levelTop',
    'levelBulk',
    ...(capThicknessNm > 0 ? (['levelCap'] as const) : []),
    'depthScale',
  ];
}

/** The setting of a parameter: what was set, else free, and the depth scale held at 1. */
export function settingOf(
  { parameters }: Pick<Assumptions, 'parameters'>,
  name: ParameterName,
): Setting {
  return parameters[name] ?? (name === 'depthScale' ? SCALE_HELD : FREE);
}

export function withSetting(
  assumptions: Assumptions,
  name: ParameterName,
  change: Partial<Setting>,
): Assumptions {
  const setting = { ...settingOf(assumptions, name), ...change };
  return { ...assumptions, parameters: { ...assumptions.parameters, [name]: setting } };
}

/** Holds a parameter at a value. */
export function held(assumptions: Assumptions, name: ParameterName, value: number): Assumptions {
  return withSetting(assumptions, name, { held: true, value });
}

/** Sets a parameter free; the depth scale comes with its usual prior when it has none. */
export function freed(assumptions: Assumptions, name: ParameterName): Assumptions {
  const prior =
    settingOf(assumptions, name).prior ?? (name === 'depthScale' ? { ...DEPTH_SCALE_PRIOR } : null);
  return withSetting(assumptions, name, { held: false, prior });
}

/** Switches a point off, or on again. */
export function toggled(assumptions: Assumptions, energyKeV: number): Assumptions {
  const off = assumptions.switchedOffKeV;
  const switchedOffKeV = off.includes(energyKeV)
    ? off.filter((energy) => energy !== energyKeV)
    : [...off, energyKeV].sort((a, b) => a - b);
  return { ...assumptions, switchedOffKeV };
}

/** The part of the assumptions that is saved with a fit. */
export function specOf({ stoppingSetId: _set, ...spec }: Assumptions): FitSpec {
  return spec;
}
