import { valuesOf } from '../fit/theta-of';
import { figure, listOf, percent, type CheckContext, type FitCheck } from './check-context';
import type { StoppingProfile } from '../types';

const LARGEST_LOSS = 0.02;
/** A profile that is still this high, of its peak, in its last bin has been cut. */
const CUT_SHARE = 0.05;
const BINS_PER_WIDTH = 5;

function profilesInUse({ prepared }: CheckContext): StoppingProfile[] {
  return prepared.profiles.flatMap((profile, index) =>
    profile && prepared.input.points[index]!.enabled ? [profile] : [],
  );
}

const energies = (profiles: readonly StoppingProfile[]): string =>
  `${listOf(profiles.map(({ energyKeV }) => figure(energyKeV)))} keV`;

/** Energies without a stopping profile of their own, and points left out because the set does not reach them. */
export const checkStoppingEnergies: FitCheck = (context) => {
  const id = 'stopping-interpolated';
  const interpolated = profilesInUse(context).filter(
    ({ interpolatedBetween }) => interpolatedBetween !== null,
  );
  if (interpolated.length === 0)
    return { id, state: 'fine', message: 'Every energy in use has a stopping profile of its own.' };
  const widest = Math.max(
    ...interpolated.map(
      ({ interpolatedBetween }) => interpolatedBetween![1] / interpolatedBetween![0],
    ),
  );
  return {
    id,
    state: 'caution',
    message: `The stopping profile is interpolated between its neighbours at ${energies(interpolated)}, at most across a factor of ${figure(widest)} in energy.`,
  };
};

/** Muons that the stopping profiles leave out. */
export const checkStoppingLoss: FitCheck = (context) => {
  const id = 'stopping-loss';
  const profiles = profilesInUse(context);
  const lossy = profiles.filter(({ lostShare }) => lostShare !== null && lostShare > LARGEST_LOSS);
  if (lossy.length > 0) {
    const worst = Math.max(...lossy.map(({ lostShare }) => lostShare!));
    return {
      id,
      state: 'caution',
      message: `More than 2 % of the muons stop outside the bins of the stopping profile at ${energies(lossy)} (up to ${percent(worst)}); the fit does not know where.`,
    };
  }
  const cut = profiles.filter((profile) => lastBinShare(profile) > CUT_SHARE);
  if (cut.length > 0) {
    const worst = Math.max(...cut.map(lastBinShare));
    return {
      id,
      state: 'caution',
      message: `The stopping profile ends before the muons do at ${energies(cut)}: its last bin is still at ${percent(worst)} of the peak.`,
    };
  }
  return {
    id,
    state: 'fine',
    message: 'The stopping profiles hold the muons to the end of their range.',
  };
};

function lastBinShare({ edgesNm, mass }: StoppingProfile): number {
  const density = (b: number): number => mass[b]! / (edgesNm[b + 1]! - edgesNm[b]!);
  let peak = 0;
  for (let b = 0; b < mass.length; b++) peak = Math.max(peak, density(b));
  return density(mass.length - 1) / peak;
}

/** Bins of the stopping profiles against the width of the edges: a coarse bin cannot show a fine edge. */
export const checkBinWidth: FitCheck = (context) => {
  const { prepared, answer } = context;
  const { trial } = prepared.problem.model;
  const values = valuesOf(answer);
  const scale = values.depthScale ?? 1;
  const graded = trial
    .landmarks(trial.shape.map(({ name }) => values[name]!))
    .filter(({ widthNm }) => widthNm > 0)
    .map(({ depthNm, widthNm }) => {
      const file = (depthNm + prepared.input.capThicknessNm) / scale;
      const bins = profilesInUse(context).map((profile) => binWidthAt(profile, file));
      return { widthNm, binNm: scale * Math.max(...bins) };
    })
    .sort((a, b) => b.binNm / b.widthNm - a.binNm / a.widthNm);
  const [worst] = graded;
  if (!worst) return null;
  const { widthNm: width, binNm: widest } = worst;
  const id = 'bin-width';
  return widest > width / BINS_PER_WIDTH
    ? {
        id,
        state: 'caution',
        message: `The depth bins near the edge (${figure(widest)} nm) are wider than a fifth of its width (${figure(width)} nm); finer stopping profiles would show it better.`,
      }
    : {
        id,
        state: 'fine',
        message: `The depth bins near the edge (${figure(widest)} nm) are fine enough for its width (${figure(width)} nm).`,
      };
};

function binWidthAt({ edgesNm }: StoppingProfile, depthNm: number): number {
  let b = 1;
  while (b < edgesNm.length - 1 && edgesNm[b]! < depthNm) b++;
  return edgesNm[b]! - edgesNm[b - 1]!;
}
