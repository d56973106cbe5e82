import { InversionError } from '../errors';
import { fit } from '../fit/fit';
import { prepareFit } from '../fit/prepare-fit';
import type { PreparedFit } from '../fit/prepared-fit';
import { valuesOf } from '../fit/theta-of';
import { defaultDepthGrid } from '../profile/default-depth-grid';
import { profileValue } from '../profile/profile-value';
import type { FitAnswer, FitInput, ParameterValues } from '../types';

/** The result with one calibration moved by its standard uncertainty. */
export interface MovedCalibration {
  values: ParameterValues;
  /** Value of the profile at each depth. */
  profile: Float64Array;
}

/** What the uncertainty of one calibration does to a result: it moves the whole profile, and is no part of its band. */
export interface CalibrationError {
  source: 'capture coefficient' | 'bulk concentration' | 'half-saturation concentration';
  /** σ over the value. */
  relativeSigma: number;
  depthsNm: Float64Array;
  /** One σ below and one above; null where the calibration would not be positive, cannot be fitted with, or leaves no minimum. */
  low: MovedCalibration | null;
  high: MovedCalibration | null;
}

interface Calibration {
  source: CalibrationError['source'];
  value: number;
  sigma: number;
  moved: (value: number) => FitInput;
}

/**
 * Systematic errors of a fit from what it was told: γ and its σ, the bulk concentration, p_half. Each is moved by ± its standard
 * uncertainty, alone, and the fit is made again. γ and, for a two-level fraction, the bulk concentration only scale the profile;
 * p_half and the bulk of bent bands move the edge as well. A calibration without a stated σ, or freed with a prior, is not listed.
 *
 * @param depthsNm depths below the cap; the default grid when left out.
 */
export function calibrationErrors(
  prepared: PreparedFit,
  answer: FitAnswer,
  depthsNm?: ArrayLike<number>,
): CalibrationError[] {
  const depths = Float64Array.from(depthsNm ?? defaultDepthGrid(prepared, answer));
  return calibrationsOf(prepared.input).map(({ source, value, sigma, moved }) => {
    const at = (shifted: number): MovedCalibration | null =>
      shifted > 0 ? resultOf(moved(shifted), depths) : null;
    return {
      source,
      relativeSigma: sigma / value,
      depthsNm: depths,
      low: at(value - sigma),
      high: at(value + sigma),
    };
  });
}

function resultOf(input: FitInput, depths: Float64Array): MovedCalibration | null {
  const prepared = preparedOrNull(input);
  if (!prepared) return null;
  const outcome = fit(prepared, { intervalsFor: [] });
  if (outcome.status === 'no-minimum') return null;
  const values = valuesOf(outcome.answer);
  return { values, profile: depths.map(profileValue(prepared, values)) };
}

/** A moved calibration may leave a held value outside its bounds, or no contrast at all: then there is no such result. */
function preparedOrNull(input: FitInput): PreparedFit | null {
  try {
    return prepareFit(input);
  } catch (error) {
    if (error instanceof InversionError) return null;
    throw error;
  }
}

function calibrationsOf(input: FitInput): Calibration[] {
  const { response, carriers, parameters } = input;
  const list: Calibration[] = [];
  const add = (
    source: Calibration['source'],
    value: number | null,
    sigma: number | null,
    moved: Calibration['moved'],
  ): void => {
    if (value !== null && value > 0 && sigma !== null && sigma > 0)
      list.push({ source, value, sigma, moved });
  };
  if (response.kind === 'capture-rate') {
    add('capture coefficient', response.gammaCm3PerS, response.gammaSigmaCm3PerS, (value) => ({
      ...input,
      response: { ...response, gammaCm3PerS: value },
    }));
  }
  if (response.kind === 'saturating-fraction') {
    add(
      'half-saturation concentration',
      response.halfPerCm3,
      response.halfSigmaPerCm3,
      (value) => ({
        ...input,
        response: { ...response, halfPerCm3: value },
      }),
    );
  }
  // A rate says the concentration itself: the bulk then matters to bent bands alone.
  const bent = input.profile === 'band-bending';
  const setting = bent ? parameters.bulkPerCm3 : undefined;
  if ((bent || response.kind !== 'capture-rate') && (!setting || setting.held)) {
    const held = setting?.value ?? carriers.bulkPerCm3;
    add('bulk concentration', held, carriers.bulkSigmaPerCm3, (value) => ({
      ...input,
      carriers: { ...carriers, bulkPerCm3: value },
      parameters: setting ? { ...parameters, bulkPerCm3: { ...setting, value } } : parameters,
    }));
  }
  return list;
}
