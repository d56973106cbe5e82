import { InversionError } from '../errors';
import type { PreparedFit } from '../fit/prepared-fit';
import { sensitivityAt } from '../fit/sensitivity';
import type { FitAnswer, StoppingSet } from '../types';
import { oneHourSigmaAt, type OneHourSigma } from './one-hour-sigma';
import type { PlanTarget } from './plan-target';

/** An energy that more time could be spent at. One hour there adds a·aᵀ to the information. */
export interface Candidate {
  energyKeV: number;
  oneHourSigma: number;
  /** a = g/σ₁ with g = ∂ŷ/∂θ, over the parameters of the plan's covariance. */
  vector: Float64Array;
}

export interface CandidateInput {
  /** Energies allowed; 61 evenly spaced in ln E over the stopping set, and the energies of the set, when left out. */
  energiesKeV?: readonly number[];
  oneHourSigma: OneHourSigma;
}

/** @throws InversionError for an empty list, energies outside the stopping set, or bad σ₁. */
export function candidatesOf(
  prepared: PreparedFit,
  answer: FitAnswer,
  { columns }: PlanTarget,
  { energiesKeV, oneHourSigma }: CandidateInput,
): Candidate[] {
  const energies = energiesKeV ?? defaultEnergies(prepared.input.stopping);
  if (energies.length === 0)
    throw new InversionError('no-candidates', 'A plan needs at least one energy to choose from.');
  const slopes = sensitivityAt(prepared, answer, energies);
  const size = prepared.parameterNames.length;
  return energies.map((energyKeV, row) => {
    const sigma = oneHourSigmaAt(oneHourSigma, energyKeV);
    return {
      energyKeV,
      oneHourSigma: sigma,
      vector: Float64Array.from(columns, (k) => slopes[row * size + k]! / sigma),
    };
  });
}

const DEFAULT_ENERGIES = 61;

function defaultEnergies({ profiles }: StoppingSet): number[] {
  const own = profiles.map(({ energyKeV }) => energyKeV);
  const [first, last] = [own[0]!, own[own.length - 1]!];
  const between = Array.from(
    { length: DEFAULT_ENERGIES - 2 },
    (_, k) => first * (last / first) ** ((k + 1) / (DEFAULT_ENERGIES - 1)),
  );
  return [...new Set([...own, ...between])].sort((a, b) => a - b);
}
