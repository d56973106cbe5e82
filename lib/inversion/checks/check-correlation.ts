import { IN_WORDS } from '../parameter-words';
import { type FitCheck } from './check-context';

const STRONG = 0.95;

/** Pairs of parameters that the scan can hardly tell apart. */
export const checkCorrelation: FitCheck = ({ answer }) => {
  const { covariance } = answer;
  const id = 'correlation';
  if (!covariance.ok) {
    return {
      id,
      state: 'problem',
      message: `The error bars cannot be computed. ${covariance.reason}`,
    };
  }
  const { names, correlation } = covariance;
  let strongest = { value: 0, a: 0, b: 0 };
  for (let a = 0; a < names.length; a++) {
    for (let b = 0; b < a; b++) {
      const value = correlation[a]![b]!;
      if (Math.abs(value) > Math.abs(strongest.value)) strongest = { value, a, b };
    }
  }
  if (strongest.value === 0) return null;
  const pair = `${IN_WORDS[names[strongest.b]!]} and ${IN_WORDS[names[strongest.a]!]}`;
  const seen = `the strongest correlation is ${strongest.value.toFixed(2).replace('-', '−')}, between ${pair}`;
  return Math.abs(strongest.value) > STRONG
    ? {
        id,
        state: 'caution',
        message: `Two parameters can hardly be told apart: ${seen}. A prior on one of them would help.`,
      }
    : { id, state: 'fine', message: `The parameters can be told apart: ${seen}.` };
};
