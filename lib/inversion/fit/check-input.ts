import { MAX_ENERGIES } from '../constants';
import { InversionError } from '../errors';
import { RESPONSES } from '../response/responses';
import { checkStoppingSet } from '../stopping/check-stopping-set';
import { sameEnergy } from '../stopping/same-energy';
import type { FitInput } from '../types';
import { isNumber, isPositive, isPositiveOrZero } from './number-range';

/** @throws InversionError with one clear sentence for whatever a fit cannot start from. */
export function checkInput(input: FitInput): void {
  checkPoints(input);
  checkCovariance(input);
  checkResponse(input);
  checkCarriers(input);
  if (!isPositiveOrZero(input.capThicknessNm)) {
    throw new InversionError(
      'bad-cap',
      `The cap layer cannot be ${input.capThicknessNm} nm thick.`,
    );
  }
  checkStoppingSet(input.stopping);
}

function checkPoints({ points }: FitInput): void {
  if (points.length === 0) throw new InversionError('empty-scan', 'The energy scan has no points.');
  if (points.length > MAX_ENERGIES) {
    throw new InversionError(
      'too-many-points',
      `The energy scan has ${points.length} points; at most ${MAX_ENERGIES} are taken.`,
    );
  }
  points.forEach(({ energyKeV, value, sigma }, index) => {
    const where = `Point ${index + 1} of the energy scan`;
    if (!isPositive(energyKeV)) {
      throw new InversionError(
        'bad-energy',
        `${where} has the energy ${energyKeV} keV; a positive number was expected.`,
        { index },
      );
    }
    if (!isNumber(value)) {
      throw new InversionError(
        'bad-value',
        `${where} (${energyKeV} keV) has the value ${value}; a finite number was expected.`,
        { index },
      );
    }
    if (!isPositive(sigma)) {
      throw new InversionError(
        'bad-sigma',
        `${where} (${energyKeV} keV) has the uncertainty ${sigma}; a positive number was expected.`,
        { index },
      );
    }
  });
  const sorted = points.map(({ energyKeV }) => energyKeV).sort((a, b) => a - b);
  for (let i = 1; i < sorted.length; i++) {
    if (sameEnergy(sorted[i]!, sorted[i - 1]!)) {
      throw new InversionError(
        'duplicate-energy',
        `The energy scan holds ${sorted[i]!} keV twice.`,
        { energyKeV: sorted[i]! },
      );
    }
  }
}

function checkResponse({ response, observable }: FitInput): void {
  if (RESPONSES[response.kind].observable !== observable) {
    throw new InversionError(
      'wrong-response',
      observable === 'rate'
        ? 'A scan of capture rates needs the capture-rate response.'
        : 'A scan of fractions needs the two-level or the saturating response.',
    );
  }
  if (response.kind === 'saturating-fraction') checkHalf(response);
  if (response.kind !== 'capture-rate') return;
  const { gammaCm3PerS, gammaSigmaCm3PerS, baselinePerUs } = response;
  if (!isPositive(gammaCm3PerS)) {
    throw new InversionError(
      'bad-gamma',
      `The capture coefficient must be a positive number of cm³/s, not ${gammaCm3PerS}.`,
    );
  }
  if (gammaSigmaCm3PerS !== null && !isPositiveOrZero(gammaSigmaCm3PerS)) {
    throw new InversionError(
      'bad-gamma',
      `The uncertainty of the capture coefficient cannot be ${gammaSigmaCm3PerS} cm³/s.`,
    );
  }
  if (!isPositiveOrZero(baselinePerUs)) {
    throw new InversionError(
      'bad-baseline',
      `The rate without carriers cannot be ${baselinePerUs} µs⁻¹.`,
    );
  }
}

function checkHalf({
  halfPerCm3,
  halfSigmaPerCm3,
}: Extract<FitInput['response'], { kind: 'saturating-fraction' }>): void {
  if (!isPositive(halfPerCm3)) {
    throw new InversionError(
      'bad-half-concentration',
      `The concentration of half saturation must be a positive number of cm⁻³, not ${halfPerCm3}.`,
    );
  }
  if (halfSigmaPerCm3 !== null && !isPositiveOrZero(halfSigmaPerCm3)) {
    throw new InversionError(
      'bad-half-concentration',
      `The uncertainty of the concentration of half saturation cannot be ${halfSigmaPerCm3} cm⁻³.`,
    );
  }
}

/** √V_ii and σ_i come from the same numbers and may differ by what a file rounds. */
const SAME_SIGMA = 1e-3;

function checkCovariance({ points, covariance }: FitInput): void {
  if (!covariance) return;
  const refuse = (message: string, detail?: Record<string, unknown>): never => {
    throw new InversionError('bad-covariance', message, detail);
  };
  const size = points.length;
  if (covariance.length !== size || covariance.some((row) => row.length !== size)) {
    refuse(
      `The covariance of ${size} points needs ${size} rows of ${size} numbers, not ${covariance.length} of ${covariance[0]?.length ?? 0}.`,
    );
  }
  covariance.forEach((row, i) => {
    row.forEach((value, j) => {
      const scale = Math.sqrt(Math.abs(row[i]! * covariance[j]![j]!));
      if (!Number.isFinite(value) || Math.abs(value - covariance[j]![i]!) > 1e-9 * scale) {
        refuse(
          `The covariance of points ${i + 1} and ${j + 1} is ${value} one way and ${covariance[j]![i]} the other; two equal finite numbers were expected.`,
          { row: i, column: j },
        );
      }
    });
    if (!(Math.abs(Math.sqrt(row[i]!) / points[i]!.sigma - 1) <= SAME_SIGMA)) {
      refuse(
        `Point ${i + 1} of the energy scan has the uncertainty ${points[i]!.sigma}, but its variance in the covariance is ${row[i]}.`,
        { row: i },
      );
    }
  });
}

function checkCarriers({ carriers }: FitInput): void {
  for (const value of [carriers.bulkPerCm3, carriers.bulkSigmaPerCm3, carriers.topPerCm3]) {
    if (value !== null && !isPositiveOrZero(value)) {
      throw new InversionError(
        'bad-concentration',
        `A carrier concentration cannot be ${value} cm⁻³.`,
      );
    }
  }
}
