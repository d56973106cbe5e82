import { runsTest } from '../statistics/runs-test';
import { figure, type FitCheck } from './check-context';

/** Runs of equal sign among the residuals in order of energy: a smooth misfit makes few and long ones. */
export const checkRuns: FitCheck = ({ answer }) => {
  const signs = answer.residuals
    .filter(({ enabled }) => enabled)
    .sort((a, b) => a.energyKeV - b.energyKeV)
    .map(({ reduced }) => reduced >= 0);
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
