import { dataChiSquare, foldAt } from '../fit/evaluate';
import { thetaOf, valuesOf } from '../fit/theta-of';
import { runsTest } from '../statistics/runs-test';
import { figure, type FitCheck } from './check-context';

/**
 * Runs of equal sign among the residuals in order of energy: a smooth misfit makes few and long ones. The residuals are whitened,
 * or an error that all points share would make long runs by itself.
 */
export const checkRuns: FitCheck = ({ prepared, answer }) => {
  const { model, data, work } = prepared.problem;
  const theta = thetaOf(prepared, valuesOf(answer));
  foldAt(model, work, theta);
  dataChiSquare(model, data, work, theta);
  const signs = Array.from(work.residual)
    .filter((_, row) => model.whitener.inverseSigma[row]! > 0)
    .map((residual) => residual >= 0);
  const test = runsTest(signs);
  if (!test) return null;
  const { runs, expected, pValue } = test;
  const id = 'residual-runs';
  const seen = `${runs} runs of equal sign where ${figure(expected)} are expected, p = ${figure(pValue)}`;
  if (pValue >= 0.05) return { id, state: 'fine', message: `Residuals look random. ${seen}.` };
  return {
    id,
    state: pValue < 0.005 ? 'problem' : 'caution',
    message: `Neighbouring residuals go together: the profile bends otherwise than the scan. ${seen}.`,
  };
};
