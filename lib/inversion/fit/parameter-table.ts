import { DEPTH_SCALE_PRIOR } from '../constants';
import { InversionError } from '../errors';
import { RESPONSES } from '../response/responses';
import type { TrialProfile } from '../profile/trial-profile';
import type { FitInput, GaussianPrior, ParameterName, ParameterSetting } from '../types';

/** Depth scales beyond a factor of two are not an error of a stopping calculation but a wrong layer or a wrong unit. */
const DEPTH_SCALE_BOUNDS = [0.5, 2] as const;

/**
 * Whether the lower and upper bound are the natural end of a parameter, so that an interval ends there. An edge at the surface
 * or past the last bin is no edge at all: there an interval stays open.
 */
export const CLOSED: Readonly<Record<ParameterName, readonly [boolean, boolean]>> = {
  edgeDepthNm: [false, false],
  edgeWidthNm: [true, false],
  levelTop: [true, true],
  levelBulk: [true, true],
  levelCap: [true, true],
  depthScale: [false, false],
};

export interface ParameterRow {
  name: ParameterName;
  lower: number;
  upper: number;
  held: boolean;
  /** Held value, or a neutral one. */
  neutral: number;
  prior: GaussianPrior | null;
}

export function depthScaleSetting({ parameters }: FitInput): ParameterSetting {
  const setting = parameters.depthScale;
  if (!setting) return { held: true, value: 1, prior: null };
  return setting.held ? setting : { ...setting, prior: setting.prior ?? DEPTH_SCALE_PRIOR };
}

/** One row per parameter of the trial profile: shape, levels, depth scale. */
export function parameterTable(
  input: FitInput,
  trial: TrialProfile,
  deepestNm: number,
): ParameterRow[] {
  const response = RESPONSES[input.response.kind];
  const levels = response.levelBounds(input.response);
  const rows: ParameterRow[] = trial.shapeNames.map((name) => row(input, name, 0, deepestNm, 0));
  rows.push(
    row(input, 'levelTop', levels[0], levels[1], 0),
    row(input, 'levelBulk', levels[0], levels[1], 0),
  );
  if (input.capThicknessNm > 0)
    rows.push(row(input, 'levelCap', response.capBounds[0], response.capBounds[1], 0));
  const scale = {
    ...input,
    parameters: { ...input.parameters, depthScale: depthScaleSetting(input) },
  };
  rows.push(row(scale, 'depthScale', ...DEPTH_SCALE_BOUNDS, 1));
  return rows;
}

function row(
  { parameters }: FitInput,
  name: ParameterName,
  lower: number,
  upper: number,
  neutral: number,
): ParameterRow {
  const setting = parameters[name];
  if (!setting) return { name, lower, upper, held: false, neutral, prior: null };
  checkSetting(name, setting, lower, upper);
  if (setting.held) return { name, lower, upper, held: true, neutral: setting.value!, prior: null };
  const { prior } = setting;
  const start = prior ? Math.min(Math.max(prior.mean, lower), upper) : neutral;
  return { name, lower, upper, held: false, neutral: start, prior };
}

function checkSetting(
  name: ParameterName,
  { held, value, prior }: ParameterSetting,
  lower: number,
  upper: number,
): void {
  if (held && (value === null || !Number.isFinite(value))) {
    throw new InversionError('no-held-value', `${name} is held but has no value.`, { name });
  }
  if (held && !(value! >= lower && value! <= upper)) {
    throw new InversionError(
      'held-out-of-bounds',
      `${name} is held at ${value!}, which lies outside ${lower} to ${Number.isFinite(upper) ? upper : 'any positive value'}.`,
      { name, lower, upper },
    );
  }
  if (
    !held &&
    prior &&
    !(Number.isFinite(prior.mean) && prior.sigma > 0 && Number.isFinite(prior.sigma))
  ) {
    throw new InversionError(
      'bad-prior',
      `The prior of ${name} needs a finite mean and a positive uncertainty.`,
      { name },
    );
  }
}
