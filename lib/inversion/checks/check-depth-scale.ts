import { IN_WORDS } from '../parameter-words';
import { figure, locatorOf, parameterOf, percent, type FitCheck } from './check-context';

/** How much of the uncertainty of the edge is the assumed accuracy of the stopping calculation. */
export const checkDepthScale: FitCheck = (context) => {
  const { answer, prepared } = context;
  const scale = parameterOf(context, 'depthScale')!;
  const edge = locatorOf(context);
  const id = 'depth-scale';
  if (scale.held) {
    if (edge.name !== 'edgeDepthNm') {
      return {
        id,
        state: 'fine',
        message: `The depth scale is held at ${figure(scale.value)}: an error of 3 % in the stopping calculation would move every depth by as much, which no interval includes.`,
      };
    }
    return {
      id,
      state: 'fine',
      message: `The depth scale is held at ${figure(scale.value)}: an error of 3 % in the stopping calculation would move the edge by ${figure(0.03 * (edge.value + prepared.input.capThicknessNm))} nm, which its interval does not include.`,
    };
  }
  const { covariance } = answer;
  if (!covariance.ok) return null;
  const [k, l] = [covariance.names.indexOf(edge.name), covariance.names.indexOf('depthScale')];
  if (k < 0 || l < 0) return null;
  const share = covariance.correlation[k]![l]! ** 2;
  return share > 0.5
    ? {
        id,
        state: 'caution',
        message: `The prior on the depth scale dominates: it makes ${percent(share)} of the variance of ${IN_WORDS[edge.name]}, and longer runs will not narrow it.`,
      }
    : {
        id,
        state: 'fine',
        message: `The prior on the depth scale makes ${percent(share)} of the variance of ${IN_WORDS[edge.name]}.`,
      };
};
