import { edgeInformationByEnergy } from '../uncertainty/edge-information-by-energy';
import { valuesOf } from '../fit/theta-of';
import type { Check } from '../types';
import {
  figure,
  locatorOf,
  parameterOf,
  percent,
  type CheckContext,
  type FitCheck,
} from './check-context';

/** Whether the muons reach the edge, and which energies speak about it. */
export const checkReach: FitCheck = (context) => {
  const edge = parameterOf(context, 'edgeDepthNm');
  if (!edge) return checkBendingReach(context);
  const { reachNm } = context.profile;
  const id = 'edge-reach';
  const at = `${figure(edge.value)} nm`;
  const [lower, upper] = edge.interval95;
  if (edge.value > reachNm) {
    const known =
      edge.held || lower === null ? '' : ` All it says is deeper than ${figure(lower)} nm (95 %).`;
    return {
      id,
      state: 'problem',
      message: `The edge at ${at} lies beyond the reach of the scan: only one muon in twenty of the deepest energy stops below ${figure(reachNm)} nm.${known}`,
    };
  }
  if (!edge.held && lower === null && upper === null) {
    return {
      id,
      state: 'problem',
      message: 'The scan does not say how deep the edge lies: any depth fits within 95 %.',
    };
  }
  if (!edge.held && (lower === null || upper === null)) {
    const side =
      lower === null ? `shallower than ${figure(upper!)} nm` : `deeper than ${figure(lower)} nm`;
    return {
      id,
      state: 'caution',
      message: `The scan bounds the edge on one side only: ${side} (95 %).`,
    };
  }
  const far = farEdgeBeyondReach(context);
  if (far !== null) {
    return {
      id,
      state: 'caution',
      message: `The far edge of the layer at ${figure(far)} nm lies beyond the reach of the scan, which ends at ${figure(reachNm)} nm.`,
    };
  }
  return { id, state: 'fine', message: `Edge is inside reach. ${sourceOf(context)}` };
};

/** Depth of a far edge that the muons hardly reach; null where there is none. */
function farEdgeBeyondReach({ prepared, answer, profile }: CheckContext): number | null {
  const { trial } = prepared.problem.model;
  const values = valuesOf(answer);
  const far = trial.landmarks(trial.shape.map(({ name }) => values[name]!))[1];
  return far && far.depthNm > profile.reachNm ? far.depthNm : null;
}

/** Bent bands have no edge of their own: what counts is the depth where the carriers reach half of the bulk. */
function checkBendingReach(context: CheckContext): Check {
  const { prepared, answer, profile } = context;
  const { trial } = prepared.problem.model;
  const values = valuesOf(answer);
  const [half] = trial.landmarks(trial.shape.map(({ name }) => values[name]!));
  const bending = locatorOf(context);
  const id = 'edge-reach';
  const goal = prepared.input.polarity === 'depletion' ? 'half of' : 'twice';
  const at =
    half!.depthNm > 0
      ? `the carriers reach ${goal} the bulk at ${figure(half!.depthNm)} nm`
      : 'the bands bend too little for the carriers at the surface to differ from the bulk by a factor of two';
  if (half!.depthNm > profile.reachNm) {
    return {
      id,
      state: 'problem',
      message: `Beyond the reach of the scan: ${at}, where only one muon in twenty of the deepest energy stops below ${figure(profile.reachNm)} nm.`,
    };
  }
  const [lower, upper] = bending.interval95;
  if (!bending.held && (lower === null || upper === null)) {
    const side =
      lower === null && upper === null
        ? 'any bending fits'
        : lower === null
          ? `less than ${figure(upper!)} eV`
          : `more than ${figure(lower)} eV`;
    return {
      id,
      state: 'caution',
      message: `The scan bounds the band bending on one side only: ${side} (95 %).`,
    };
  }
  return { id, state: 'fine', message: `Inside reach: ${at}. ${sourceOf(context)}` };
}

/** The three neighbouring energies that know most of the edge. */
function sourceOf({ prepared, answer }: CheckContext): string {
  const shares = edgeInformationByEnergy(prepared, answer);
  const points = prepared.input.points
    .map(({ energyKeV, enabled }, index) => ({ energyKeV, enabled, share: shares[index]! }))
    .filter(({ enabled }) => enabled)
    .sort((a, b) => a.energyKeV - b.energyKeV);
  let best = { share: 0, from: 0, to: 0 };
  for (let k = 0; k < points.length; k++) {
    const window = points.slice(k, k + 3);
    const share = window.reduce((sum, point) => sum + point.share, 0);
    if (share > best.share)
      best = { share, from: window[0]!.energyKeV, to: window[window.length - 1]!.energyKeV };
  }
  if (best.share === 0) return 'The points cannot tell it from the other parameters.';
  return `${percent(best.share)} of the information on it comes from ${figure(best.from)} to ${figure(best.to)} keV.`;
}
