import { IN_WORDS } from '../parameter-words';
import { figure, listOf, type FitCheck } from './check-context';

/** Parameters pressed against a bound: their error bar is one-sided, and another model may be meant. */
export const checkBounds: FitCheck = ({ answer }) => {
  const id = 'parameter-at-bound';
  const pressed = answer.parameters.filter(({ atBound }) => atBound !== null);
  if (pressed.length === 0) return { id, state: 'fine', message: 'No parameter lies at a bound.' };
  const words = pressed.map(
    ({ name, value, atBound }) => `${IN_WORDS[name]} (${figure(value)}, its ${atBound} bound)`,
  );
  const harmless = pressed.every(
    ({ name, atBound }) =>
      atBound === 'lower' && (name === 'edgeWidthNm' || name === 'farEdgeWidthNm'),
  );
  const meaning = harmless
    ? 'The scan cannot tell the edge from a sharp one.'
    : 'Its interval is one-sided; holding it, or another trial profile, may be meant.';
  return {
    id,
    state: pressed.some(({ name }) => name === 'edgeDepthNm' || name === 'surfacePotentialEv')
      ? 'problem'
      : 'caution',
    message: `At a bound: ${listOf(words)}. ${meaning}`,
  };
};
