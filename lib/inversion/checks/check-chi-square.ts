import type { Check, FitAnswer } from '../types';

export function checkChiSquare({ chiSquare, degreesOfFreedom, pValue }: FitAnswer): Check {
  const id = 'chi-square';
  const figure = `χ² ${chiSquare.toFixed(1)} for ${degreesOfFreedom} degrees of freedom`;
  if (pValue === null)
    return {
      id,
      state: 'caution',
      message: `${figure}: with none to spare, the fit cannot be judged.`,
    };
  if (pValue < 0.001)
    return {
      id,
      state: 'problem',
      message: `${figure}: the profile does not describe the points.`,
    };
  if (pValue < 0.05)
    return { id, state: 'caution', message: `${figure}: the profile describes the points poorly.` };
  if (pValue > 0.999)
    return { id, state: 'caution', message: `${figure}: the uncertainties look too large.` };
  return { id, state: 'fine', message: `${figure}.` };
}
