import { DEPTH_SCALE_PRIOR } from '../constants';
import { InversionError } from '../errors';
import { RESPONSES } from '../response/responses';
import { isNumber, isPositive } from './number-range';
import type { ShapeParameter, TrialProfile } from '../profile/trial-profile';
import { IN_WORDS, sentence } from '../parameter-words';
import type { FitInput, GaussianPrior, ParameterName, ParameterSetting } from '../types';

/** Depth scales beyond a factor of two are not an error of a stopping calculation but a wrong layer or a wrong unit. */
const DEPTH_SCALE_BOUNDS = [0.5, 2] as const;

export interface ParameterRow {
  name: ParameterName;
  lower: number;
  upper: number;
  /** Whether a bound is the natural end of the parameter, so that an interval ends there and is not open. */
  closed: readonly [boolean, boolean];
  held: boolean;
  /** Held value, or a neutral one. */
  neutral: number;
  prior: GaussianPrior | null;
}

/** The depth scale is held at 1 unless the settings say otherwise, and free only with a prior. */
function depthScaleSetting({ parameters }: FitInput): ParameterSetting {
  const setting = parameters.depthScale;
  if (!setting) return { held: true, value: 1, prior: null };
  return setting.held ? setting : { ...setting, prior: setting.prior ?? DEPTH_SCALE_PRIOR };
}

export function depthScaleRow(input: FitInput): ParameterRow {
  const [lower, upper] = DEPTH_SCALE_BOUNDS;
  return row(
    { depthScale: depthScaleSetting(input) },
    { name: 'depthScale', lower, upper, closed: [false, false], given: null },
    1,
  );
}

/** One row per parameter of the trial profile: shape, levels, depth scale. */
export function parameterTable(input: FitInput, trial: TrialProfile): ParameterRow[] {
  const response = RESPONSES[input.response.kind];
  const [lower, upper] = response.levelBounds(input.response);
  const level = { lower, upper, closed: [true, true], given: null } as const;
  const [capLower, capUpper] = response.capBounds;
  const settings = input.parameters;
  const rows = trial.shape.map((parameter) => row(settings, parameter, parameter.given ?? 0));
  rows.push(
    row(settings, { ...level, name: 'levelTop', given: carrierFreeLevel(input) }, 0),
    row(settings, { ...level, name: 'levelBulk' }, 0),
  );
  if (input.capThicknessNm > 0)
    rows.push(row(settings, { ...level, name: 'levelCap', lower: capLower, upper: capUpper }, 0));
  return [...rows, depthScaleRow(input)];
}

/** Bent bands leave no carriers at s = 0, where a rate is therefore known; null where the level is for the data to say. */
function carrierFreeLevel({ profile, response }: FitInput): number | null {
  return profile === 'band-bending' && response.kind === 'capture-rate'
    ? response.baselinePerUs
    : null;
}

function row(
  parameters: FitInput['parameters'],
  { name, lower, upper, closed, given }: ShapeParameter,
  neutral: number,
): ParameterRow {
  const setting = parameters[name] ?? { held: given !== null, value: given, prior: null };
  checkSetting(name, setting, lower, upper);
  const { held, prior } = setting;
  const start = prior ? Math.min(Math.max(prior.mean, lower), upper) : neutral;
  return {
    name,
    lower,
    upper,
    closed,
    held,
    neutral: held ? setting.value! : start,
    prior: held ? null : prior,
  };
}

function checkSetting(
  name: ParameterName,
  { held, value, prior }: ParameterSetting,
  lower: number,
  upper: number,
): void {
  if (held && (value === null || !Number.isFinite(value))) {
    throw new InversionError('no-held-value', `${sentence(name)} is held but has no value.`, {
      name,
    });
  }
  if (held && !(value! >= lower && value! <= upper)) {
    throw new InversionError(
      'held-out-of-bounds',
      `${sentence(name)} is held at ${value!}, which lies outside ${lower} to ${Number.isFinite(upper) ? upper : 'any positive value'}.`,
      { name, lower, upper },
    );
  }
  if (!held && prior && !(isNumber(prior.mean) && isPositive(prior.sigma))) {
    throw new InversionError(
      'bad-prior',
      `The prior of ${IN_WORDS[name]} needs a finite mean and a positive uncertainty.`,
      { name },
    );
  }
}
