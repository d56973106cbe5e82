import type { PreparedFit } from '../fit/prepared-fit';
import type { CarrierProfile, Check, FitAnswer } from '../types';
import { checkBounds } from './check-bounds';
import { checkChiSquare } from './check-chi-square';
import { checkClosure } from './check-closure';
import type { FitCheck } from './check-context';
import { checkCorrelation } from './check-correlation';
import { checkDepthScale } from './check-depth-scale';
import { checkBandBending, checkDebyeLength } from './check-electrostatics';
import { checkInfluence } from './check-influence';
import { checkPoints } from './check-points';
import { checkReach } from './check-reach';
import {
  checkCaptureCoefficient,
  checkContrast,
  checkConvergence,
  checkPolarity,
} from './check-response';
import { checkRuns } from './check-runs';
import { checkBinWidth, checkStoppingEnergies, checkStoppingLoss } from './check-stopping';

/** In the order in which they are read. A new check is one function in this list. */
const CHECKS: readonly FitCheck[] = [
  checkConvergence,
  checkReach,
  checkChiSquare,
  checkRuns,
  checkPoints,
  checkContrast,
  checkPolarity,
  checkBounds,
  checkCorrelation,
  checkDepthScale,
  checkStoppingEnergies,
  checkStoppingLoss,
  checkBinWidth,
  checkInfluence,
  checkClosure,
  checkDebyeLength,
  checkBandBending,
  checkCaptureCoefficient,
];

/** The checks that this fit carries, each with its state and a sentence with the figure in it. */
export function runChecks(
  prepared: PreparedFit,
  answer: FitAnswer,
  profile: CarrierProfile,
): Check[] {
  return CHECKS.flatMap((check) => check({ prepared, answer, profile }) ?? []);
}
