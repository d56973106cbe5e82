import { DEFAULT_RESAMPLES, DEPTH_SCALE_PRIOR } from '@/lib/inversion/index';
import type { FitSpec } from '@/lib/schemas/fit';
import { DEMO_GAMMA } from './scans';
import { SCAN_STATES } from './scan-states';
import type { DemoFit, DemoReviewEvent } from './types';
import { dopingSigma, waferOf, type Wafer } from './wafers';

/** Levels from bulk reference runs are known to about this; invented. */
const LEVEL_SIGMA = 0.02;

/** Two accepted fits, one in review with a thread, one returned and revised, and two drafts beside them. */
export function demoFits(seed: number): DemoFit[] {
  return [
    {
      ...fitOf(seed, 'nb31-graded', 'nb31-oxidised-dark', 'graded'),
      name: 'NB-31 as oxidised, graded edge',
      outcome: 'accepted',
      events: [
        by('analyst', 'submitted', 'Both levels come out where the bulk runs put them.'),
        by(
          'reviewer',
          'accepted',
          'The edge is well inside the reach and the residuals look random.',
        ),
      ],
    },
    {
      ...fitOf(seed, 'nb34-sharp', 'nb34-oxidised-dark', 'sharp'),
      name: 'NB-34 as oxidised, sharp edge',
      notes: 'Kept to compare with the graded edge.',
    },
    {
      ...fitOf(seed, 'nb34-graded', 'nb34-oxidised-dark', 'graded'),
      name: 'NB-34 as oxidised, graded edge',
      outcome: 'accepted',
      events: [
        by('analyst', 'submitted', 'Please look at the sharp edge on the same scan, too.'),
        by('reviewer', 'comment', 'Compared both: the depth is the same within its interval.'),
        by(
          'reviewer',
          'accepted',
          'The graded edge says honestly how little is known of the width.',
        ),
      ],
    },
    {
      ...fitOf(seed, 'nb37-sharp', 'nb37-oxidised-dark', 'sharp'),
      name: 'NB-37 as oxidised, sharp edge',
      outcome: 'returned',
      events: [
        by('analyst', 'submitted', ''),
        by(
          'reviewer',
          'comment',
          'Most of these muons stop in the oxide. What holds the level in front of the edge?',
          'point 3 keV',
        ),
        by(
          'reviewer',
          'returned',
          'A sharp edge hides what is not known about the width, and the depth scale is held. Please fit a graded edge with the depth scale free.',
        ),
      ],
    },
    {
      ...fitOf(seed, 'nb37-graded', 'nb37-oxidised-dark', 'graded', { depthScaleFree: true }),
      name: 'NB-37 as oxidised, graded edge',
      notes: 'Revised after review: graded edge, depth scale free with its prior.',
      parentKey: 'nb37-sharp',
    },
    {
      ...fitOf(seed, 'hx204-graded', 'hx204-fraction', 'graded', { depthScaleFree: true }),
      name: 'Edge fit, alumina side',
      outcome: 'submitted',
      events: [
        by(
          'analyst',
          'submitted',
          'The capture rates of the same wafer are fitted next to this one.',
        ),
        by(
          'reviewer',
          'comment',
          'Is the alumina thick enough to matter at this energy?',
          'point 2 keV',
        ),
        by(
          'analyst',
          'comment',
          'It takes a small share of the stops; its level is free and hardly moves the edge.',
          'point 2 keV',
        ),
        by(
          'reviewer',
          'comment',
          'Then the depth scale is the larger question. How far does the edge move with it?',
          'depth 80 nm',
        ),
      ],
    },
    {
      ...fitOf(seed, 'hx204-rate', 'hx204-rate', 'graded'),
      name: 'Capture rate, alumina side',
      notes: 'The capture coefficient is invented.',
    },
  ];
}

function by(
  byKey: string,
  kind: DemoReviewEvent['kind'],
  body: string,
  target = '',
): DemoReviewEvent {
  return { kind, byKey, body, target };
}

interface Choices {
  depthScaleFree?: boolean;
}

/** A draft by the analyst; the caller says what became of it. */
function fitOf(
  seed: number,
  key: string,
  scanKey: string,
  profile: FitSpec['profile'],
  { depthScaleFree = false }: Choices = {},
): Omit<DemoFit, 'name'> {
  const state = SCAN_STATES.find((one) => one.key === scanKey);
  if (!state) throw new Error(`the demo has no scan ${scanKey}`);
  const wafer = waferOf(state.waferKey);
  const isRate = state.observable === 'rate';
  return {
    key,
    notes: '',
    scanKey,
    stoppingKey: wafer.stack.stoppingKey,
    authorKey: 'analyst',
    parentKey: null,
    spec: {
      profile,
      polarity: wafer.polarity,
      response: isRate ? { kind: 'capture-rate', ...DEMO_GAMMA } : { kind: 'two-level' },
      carriers: carriersOf(wafer, isRate),
      capThicknessNm: wafer.stack.capThicknessNm,
      parameters: { ...(isRate ? {} : levelPriors(wafer)), ...depthScale(depthScaleFree) },
      switchedOffKeV: [],
      seed,
      resamples: DEFAULT_RESAMPLES,
    },
    outcome: 'draft',
    events: [],
    invented: true,
  };
}

/** Rates give concentrations by themselves; a fraction needs the bulk value. */
function carriersOf({ dopingPerCm3 }: Wafer, isRate: boolean): FitSpec['carriers'] {
  if (isRate) return { bulkPerCm3: null, bulkSigmaPerCm3: null, topPerCm3: null };
  return { bulkPerCm3: dopingPerCm3, bulkSigmaPerCm3: dopingSigma(dopingPerCm3), topPerCm3: null };
}

function levelPriors({ stack }: Wafer): FitSpec['parameters'] {
  const prior = { mean: stack.levelPopulated, sigma: LEVEL_SIGMA };
  return {
    levelBulk: { held: false, value: null, prior, origin: 'bulk reference runs (invented)' },
  };
}

function depthScale(isFree: boolean): FitSpec['parameters'] {
  if (!isFree) return { depthScale: { held: true, value: 1, prior: null, origin: '' } };
  const prior = { ...DEPTH_SCALE_PRIOR };
  return {
    depthScale: {
      held: false,
      value: null,
      prior,
      origin: 'usual accuracy of a stopping calculation',
    },
  };
}
