import { resample } from '../uncertainty/resample';
import { figure, locatorOf, locatorWords, type FitCheck } from './check-context';

/** Few repeats: this looks for a fit that cannot find its own answer again, not for the last per cent of coverage. */
const REPEATS = 24;
const SEED = 20_260_114;

/** Closure: scans simulated from the fit and fitted again must give its edge back, with the scatter that its interval states. */
export const checkClosure: FitCheck = (context) => {
  const { prepared, answer } = context;
  const edge = locatorOf(context);
  const column = prepared.freeNames.indexOf(edge.name);
  const id = 'closure';
  if (column < 0) return null;
  const [lower, upper] = edge.interval68;
  const sigma = lower !== null && upper !== null ? (upper - lower) / 2 : edge.sigma;
  if (sigma === null || !(sigma > 0)) return null;
  const rows = resample(prepared, answer, { seed: SEED, first: 0, count: REPEATS });
  const size = prepared.freeNames.length;
  const pulls = Array.from(
    { length: REPEATS },
    (_, r) => (rows[r * size + column]! - edge.value) / sigma,
  );
  const mean = pulls.reduce((sum, pull) => sum + pull, 0) / REPEATS;
  const scatter = Math.sqrt(
    pulls.reduce((sum, pull) => sum + (pull - mean) ** 2, 0) / (REPEATS - 1),
  );
  const [less, more] =
    edge.name === 'edgeDepthNm' ? ['shallower', 'deeper'] : ['smaller', 'larger'];
  const way = mean < 0 ? less : more;
  const seen = `in ${REPEATS} simulated scans the ${locatorWords(edge).what} comes back ${figure(Math.abs(mean))} standard deviations ${way} on average, with ${figure(scatter)} times the scatter stated`;
  // Three standard errors of the mean, and of the scatter (1/√(2(n − 1)) relative).
  const biased = Math.abs(mean) > (3 * Math.max(1, scatter)) / Math.sqrt(REPEATS);
  const misjudged = Math.abs(scatter - 1) > 3 / Math.sqrt(2 * (REPEATS - 1));
  return biased || misjudged
    ? {
        id,
        state: 'caution',
        message: `The fit does not quite find its own answer again: ${seen}.`,
      }
    : { id, state: 'fine', message: `The fit finds its own answer again: ${seen}.` };
};
