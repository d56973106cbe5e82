import { figure, type FitCheck } from './check-context';

/** χ² both ways: too large says the profile is wrong or the errors too small, too small says the errors are too large. */
export const checkChiSquare: FitCheck = ({ answer }) => {
  const { chiSquare, degreesOfFreedom, pValue } = answer;
  const id = 'chi-square';
  if (pValue === null) return null;
  const seen = `χ² is ${figure(chiSquare)} for ${degreesOfFreedom} degrees of freedom, p = ${figure(pValue)}`;
  if (pValue < 0.001) {
    return { id, state: 'problem', message: `The profile does not describe the points. ${seen}.` };
  }
  if (pValue < 0.05) {
    return {
      id,
      state: 'caution',
      message: `The profile describes the points poorly, or their uncertainties are too small. ${seen}.`,
    };
  }
  if (pValue > 0.995) {
    return {
      id,
      state: 'caution',
      message: `The points scatter less than their uncertainties say: these may be too large. ${seen}.`,
    };
  }
  return { id, state: 'fine', message: `The profile describes the points. ${seen}.` };
};
