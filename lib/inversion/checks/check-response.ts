import { figure, parameterOf, percent, type FitCheck } from './check-context';

/** Whether the two levels differ: without contrast there is no edge to see. */
export const checkContrast: FitCheck = (context) => {
  const { covariance } = context.answer;
  const top = parameterOf(context, 'levelTop')!;
  const bulk = parameterOf(context, 'levelBulk')!;
  if (!covariance.ok) return null;
  const [k, l] = [covariance.names.indexOf('levelTop'), covariance.names.indexOf('levelBulk')];
  const entry = (a: number, b: number): number => (a < 0 || b < 0 ? 0 : covariance.matrix[a]![b]!);
  const sigma = Math.sqrt(Math.max(0, entry(k, k) + entry(l, l) - 2 * entry(k, l)));
  if (!(sigma > 0)) return null;
  const contrast = Math.abs(bulk.value - top.value) / sigma;
  const seen = `the levels on the two sides of the edge differ by ${figure(contrast)} standard deviations`;
  const id = 'contrast';
  if (contrast < 3) return { id, state: 'problem', message: `There may be no edge: ${seen}.` };
  if (contrast < 6) return { id, state: 'caution', message: `The edge shows weakly: ${seen}.` };
  return { id, state: 'fine', message: `The edge shows clearly: ${seen}.` };
};

/** A capture rate says on which side the carriers are; it must agree with the polarity assumed. */
export const checkPolarity: FitCheck = (context) => {
  const { response, polarity, profile } = context.prepared.input;
  // Bent bands follow the polarity by themselves.
  if (response.kind !== 'capture-rate' || profile === 'band-bending') return null;
  const top = parameterOf(context, 'levelTop')!.value;
  const bulk = parameterOf(context, 'levelBulk')!.value;
  const id = 'polarity';
  const agrees = polarity === 'depletion' ? bulk >= top : top >= bulk;
  return agrees
    ? {
        id,
        state: 'fine',
        message: `The rates agree with ${polarity}: ${figure(top)} µs⁻¹ above the edge, ${figure(bulk)} µs⁻¹ below it.`,
      }
    : {
        id,
        state: 'problem',
        message: `The rates contradict ${polarity}: ${figure(top)} µs⁻¹ above the edge, ${figure(bulk)} µs⁻¹ below it.`,
      };
};

/** The capture coefficient moves the whole profile; its uncertainty is no part of the band. */
export const checkCaptureCoefficient: FitCheck = ({ prepared }) => {
  const { response } = prepared.input;
  if (response.kind !== 'capture-rate') return null;
  const id = 'capture-coefficient';
  if (response.gammaSigmaCm3PerS === null) {
    return {
      id,
      state: 'caution',
      message:
        'The capture coefficient has no uncertainty stated: the concentrations are only as good as it is.',
    };
  }
  const share = response.gammaSigmaCm3PerS / response.gammaCm3PerS;
  return {
    id,
    state: share > 0.3 ? 'caution' : 'fine',
    message: `The capture coefficient is known to ${percent(share)}: the whole profile may shift by that much, apart from its band.`,
  };
};

/** Whether the minimum was reached. */
export const checkConvergence: FitCheck = ({ answer }) =>
  answer.status === 'converged'
    ? null
    : {
        id: 'convergence',
        state: 'problem',
        message: `The fit stopped before its minimum (${answer.status}) after ${answer.evidence.iterations} iterations; χ² might still fall by ${figure(answer.evidence.predictedReduction)}.`,
      };
