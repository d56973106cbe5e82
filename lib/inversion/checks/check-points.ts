import type { FitCheck } from './check-context';

/** Points against parameters: what is left over to judge the fit by. */
export const checkPoints: FitCheck = ({ prepared, answer }) => {
  const { enabledCount, priorCount } = prepared;
  const spare = answer.degreesOfFreedom;
  const priors =
    priorCount === 0 ? '' : priorCount === 1 ? ' and 1 prior' : ` and ${priorCount} priors`;
  const counted = `${enabledCount} points${priors} for ${answer.freeParameters} free parameters leave ${spare} degrees of freedom`;
  const id = 'points-vs-parameters';
  if (spare <= 0)
    return { id, state: 'problem', message: `Nothing is left to judge the fit by. ${counted}.` };
  if (spare < 3)
    return { id, state: 'caution', message: `Little is left to judge the fit by. ${counted}.` };
  return { id, state: 'fine', message: `There are enough points. ${counted}.` };
};
