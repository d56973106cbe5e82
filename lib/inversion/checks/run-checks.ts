import type { PreparedFit } from '../fit/prepared-fit';
import type { CarrierProfile, Check, FitAnswer } from '../types';
import { checkChiSquare } from './check-chi-square';

/** The checks that every fit carries. */
export function runChecks(
  prepared: PreparedFit,
  answer: FitAnswer,
  _profile: CarrierProfile,
): Check[] {
  return [checkPoints(prepared), checkChiSquare(answer)];
}

function checkPoints({ enabledCount, freeNames, priorCount }: PreparedFit): Check {
  const spare = enabledCount + priorCount - freeNames.length;
  return {
    id: 'points-vs-parameters',
    state: spare >= 3 ? 'fine' : 'caution',
    message: `${enabledCount} points for ${freeNames.length} free parameters.`,
  };
}
