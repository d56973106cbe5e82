import { MAX_ENERGIES } from '../constants';
import { InversionError } from '../errors';
import { sameEnergy } from '../stopping/same-energy';
import type { GaussianPrior } from '../types';
import { checkNumber } from './check-cycle';

export interface TemperaturePoint {
  temperatureK: number;
  /** λ: relaxation rate of the diamagnetic line, µs⁻¹. */
  ratePerUs: number;
  sigma: number;
  /** A point switched off stays in the scan and out of the fit. */
  enabled: boolean;
}

/** Relaxation rate against temperature at one implantation energy. */
export interface TemperatureScan {
  energyKeV: number;
  points: readonly TemperaturePoint[];
}

/** Everything that a joint fit of temperature scans depends on. */
export interface JointFitInput {
  scans: readonly TemperatureScan[];
  /** A of the muonium centre that ionises, MHz. */
  hyperfineMHz: number;
  /** Transverse field, mT. */
  fieldMt: number;
  /** One E_A for all energies, or one for each; ν is always shared. */
  activation: 'shared' | 'per energy';
  /** ν held at this, µs⁻¹; free when left out. */
  heldAttemptPerUs?: number;
  /** E_A (each of them) held at this, meV; free when left out. */
  heldActivationMeV?: number;
  /** Prior on E_A (each of them), meV. */
  activationPriorMeV?: GaussianPrior;
  /** λ₀ held at this, µs⁻¹; free and ≥ 0 when left out. */
  heldBaselinePerUs?: number;
}

/** What ν and E_A may be: 10⁹ to 10¹⁶ s⁻¹, 1 meV to 3 eV. */
export const ATTEMPT_BOUNDS_PER_US = [1e3, 1e10] as const;
export const ACTIVATION_BOUNDS_MEV = [1, 3000] as const;
/** Most temperatures in one scan. */
export const MAX_TEMPERATURES = 1_000;

/** @throws InversionError with one clear sentence for whatever a joint fit cannot start from. */
export function checkJointFitInput(input: JointFitInput): void {
  checkNumber(input.hyperfineMHz, 'hyperfine constant', 'MHz');
  checkNumber(input.fieldMt, 'transverse field', 'mT');
  checkSettings(input);
  const { scans } = input;
  if (scans.length === 0) {
    throw new InversionError('empty-series', 'The series has no temperature scans.');
  }
  if (scans.length > MAX_ENERGIES) {
    throw new InversionError(
      'too-many-scans',
      `The series has ${scans.length} energies; at most ${MAX_ENERGIES} are taken.`,
    );
  }
  scans.forEach(checkScan);
  const energies = scans.map(({ energyKeV }) => energyKeV).sort((one, other) => one - other);
  energies.forEach((energyKeV, k) => {
    if (k > 0 && sameEnergy(energyKeV, energies[k - 1]!)) {
      throw new InversionError(
        'duplicate-energy',
        `The series holds ${energyKeV} keV twice; one temperature scan per energy was expected.`,
        { energyKeV },
      );
    }
  });
}

function checkSettings(input: JointFitInput): void {
  checkHeld(input.heldAttemptPerUs, 'held attempt frequency', 'µs⁻¹', ATTEMPT_BOUNDS_PER_US);
  checkHeld(input.heldActivationMeV, 'held activation energy', 'meV', ACTIVATION_BOUNDS_MEV);
  const { heldBaselinePerUs, activationPriorMeV: prior } = input;
  if (heldBaselinePerUs !== undefined) {
    checkNumber(heldBaselinePerUs, 'held background rate', 'µs⁻¹', true);
  }
  if (!prior) return;
  checkNumber(prior.mean, 'mean of the activation prior', 'meV');
  checkNumber(prior.sigma, 'uncertainty of the activation prior', 'meV');
  if (input.heldActivationMeV !== undefined) {
    throw new InversionError(
      'held-with-prior',
      'The activation energy is either held or has a prior, not both.',
    );
  }
}

function checkHeld(
  value: number | undefined,
  name: string,
  unit: string,
  [least, most]: readonly [number, number],
): void {
  if (value === undefined) return;
  checkNumber(value, name, unit);
  if (value < least || value > most) {
    throw new InversionError(
      'out-of-range',
      `The ${name} must lie between ${least} and ${most} ${unit}, not at ${value}.`,
    );
  }
}

function checkScan({ energyKeV, points }: TemperatureScan): void {
  checkNumber(energyKeV, 'implantation energy of a temperature scan', 'keV');
  if (points.length > MAX_TEMPERATURES) {
    throw new InversionError(
      'too-many-points',
      `The scan at ${energyKeV} keV has ${points.length} temperatures; at most ${MAX_TEMPERATURES} are taken.`,
    );
  }
  if (!points.some(({ enabled }) => enabled)) {
    throw new InversionError(
      'empty-scan',
      `The scan at ${energyKeV} keV has no point that is switched on.`,
      { energyKeV },
    );
  }
  points.forEach(({ temperatureK, ratePerUs, sigma }, index) => {
    const where = `Point ${index + 1} of the scan at ${energyKeV} keV`;
    if (!(temperatureK > 0 && Number.isFinite(temperatureK))) {
      throw new InversionError(
        'bad-temperature',
        `${where} has the temperature ${temperatureK} K; a positive number was expected.`,
        { energyKeV, index },
      );
    }
    if (!Number.isFinite(ratePerUs)) {
      throw new InversionError(
        'bad-value',
        `${where} has the rate ${ratePerUs}; a finite number was expected.`,
        { energyKeV, index },
      );
    }
    if (!(sigma > 0 && Number.isFinite(sigma))) {
      throw new InversionError(
        'bad-sigma',
        `${where} has the uncertainty ${sigma}; a positive number was expected.`,
        { energyKeV, index },
      );
    }
  });
}
