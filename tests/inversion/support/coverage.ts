import {
  fit,
  prepareFit,
  simulateScan,
  type FitInput,
  type Interval,
  type ParameterName,
  type ParameterValues,
} from '@/lib/inversion/index';
import { normalStream } from '@/lib/inversion/statistics/random';
import { free } from './scans';

/**
 * What is measured of the intervals: scans from one truth, fitted by one input. "Edge" is what places the profile: the depth of its
 * (near) edge, for band bending the surface potential.
 */
export interface CoverageSetting {
  name: string;
  /** Energies, σ, trial profile, priors; the values of its points are not read. */
  input: FitInput;
  truth: ParameterValues;
  /** So many times the usual number of scans, where that leaves doubt. */
  repeat?: number;
}

export interface Coverage {
  scans: number;
  /** Scans of which the fit says nothing of the edge; they have no interval and count nowhere below. */
  noMinimum: number;
  /** Fits that did not converge; they count below like any other. */
  notConverged: number;
  /** 95 % intervals of the edge with one side open, and with both. */
  oneSided: number;
  open: number;
  /** Intervals of the edge that hold the truth. */
  edge68: number;
  edge95: number;
  /** Upper ends of the 95 % interval of the width at or above the truth; null where no width is fitted. */
  widthLimit: number | null;
  /** Widths fitted at 0, where the product says "less than" that end, and how many of those are right. */
  widthAtZero: number;
  widthAtZeroRight: number;
}

/** Streams of the drawn truths, apart from those of the noise of the points. */
const TRUTH_STREAM = 10_000;

/**
 * A prior says that the parameter is drawn from it, so its truth is drawn from it for each scan; the other parameters keep one.
 */
function drawnTruth({ input, truth }: CoverageSetting, seed: number): ParameterValues {
  const drawn: ParameterValues = { depthScale: 1, ...truth };
  Object.entries(input.parameters).forEach(([name, { held, prior }], k) => {
    if (held || !prior) return;
    drawn[name as ParameterName] =
      prior.mean + prior.sigma * normalStream(seed, TRUTH_STREAM + k)();
  });
  return drawn;
}

const holds = ([lower, upper]: Interval, truth: number): boolean =>
  (lower === null || lower <= truth) && (upper === null || truth <= upper);

/** Simulates, fits and counts. Seeds run on from firstSeed. */
export function coverageOf(setting: CoverageSetting, scans: number, firstSeed: number): Coverage {
  const { input } = setting;
  const place = input.profile === 'band-bending' ? 'surfacePotentialEv' : 'edgeDepthNm';
  const fitsWidth = setting.truth.edgeWidthNm !== undefined && !input.parameters.edgeWidthNm?.held;
  const count: Coverage = {
    scans,
    noMinimum: 0,
    notConverged: 0,
    oneSided: 0,
    open: 0,
    edge68: 0,
    edge95: 0,
    widthLimit: fitsWidth ? 0 : null,
    widthAtZero: 0,
    widthAtZeroRight: 0,
  };
  for (let seed = firstSeed; seed < firstSeed + scans; seed++) {
    const truth = drawnTruth(setting, seed);
    const points = simulateScan({
      input: { ...input, parameters: { depthScale: free } },
      values: truth,
      seed,
    });
    const outcome = fit(prepareFit({ ...input, points }), {
      intervalsFor: [place, 'edgeWidthNm'],
    });
    if (outcome.status === 'no-minimum') {
      count.noMinimum++;
      continue;
    }
    if (outcome.status !== 'converged') count.notConverged++;
    const { parameters } = outcome.answer;
    const edge = parameters.find(({ name }) => name === place)!;
    const ends = edge.interval95.filter((end) => end !== null).length;
    if (ends === 1) count.oneSided++;
    if (ends === 0) count.open++;
    if (holds(edge.interval68, truth[place]!)) count.edge68++;
    if (holds(edge.interval95, truth[place]!)) count.edge95++;
    if (!fitsWidth) continue;
    const width = parameters.find(({ name }) => name === 'edgeWidthNm')!;
    const right = holds([null, width.interval95[1]], truth.edgeWidthNm!);
    if (right) count.widthLimit!++;
    if (width.atBound === 'lower') count.widthAtZero++;
    if (width.atBound === 'lower' && right) count.widthAtZeroRight++;
  }
  return count;
}
