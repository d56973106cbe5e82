import {
  prepareFit,
  simulateScan,
  type FitInput,
  type ParameterName,
  type ParameterSetting,
  type ParameterValues,
} from '@/lib/inversion/index';
import { fractionInput, free, freeWith, heldAt, rateInput, uniforms } from './scans';

/** What a random scan is of; "saturating" is a graded edge under the saturating fraction. */
export const RANDOM_KINDS = ['edge', 'layer', 'band-bending', 'saturating'] as const;
export type RandomKind = (typeof RANDOM_KINDS)[number];

type Random = ReturnType<typeof uniforms>;

/** Numbers that every kind draws alike: levels, σ, cap. */
interface Common {
  random: Random;
  rate: boolean;
  low: number;
  contrast: number;
  /** The level of the bulk is the higher one. */
  rising: boolean;
  sigma: number;
  capThicknessNm: number;
  parameters: Partial<Record<ParameterName, ParameterSetting>>;
}

const logBetween = (random: Random, low: number, high: number): number =>
  Math.exp(random.between(Math.log(low), Math.log(high)));

/** Deepest edge of the truth, nm: the deepest energy of the set reaches about 200. */
const DEEPEST_EDGE_NM = 230;

function common(random: Random, rate: boolean): Common {
  const low = rate ? random.between(0.02, 0.3) : random.between(0.05, 0.5);
  const contrast = rate ? random.between(0.5, 5) : random.between(0.1, 0.45);
  const rising = random.next() < 0.5;
  const sigma = contrast / logBetween(random, 3, 300);
  const capThicknessNm = random.next() < 0.2 ? 12 : 0;
  const { levelTop, levelBulk } = levelsOf({ low, contrast, rising });
  const parameters: Common['parameters'] = {};
  if (random.next() < 0.3) parameters.depthScale = random.next() < 0.5 ? free : freeWith(1, 0.05);
  if (random.next() < 0.3) parameters.levelBulk = freeWith(levelBulk, contrast / 10);
  if (random.next() < 0.2) parameters.levelTop = heldAt(levelTop);
  return { random, rate, low, contrast, rising, sigma, capThicknessNm, parameters };
}

function levelsOf({ low, contrast, rising }: Pick<Common, 'low' | 'contrast' | 'rising'>): {
  levelTop: number;
  levelBulk: number;
} {
  return { levelTop: rising ? low : low + contrast, levelBulk: rising ? low + contrast : low };
}

function edgeScan(random: Random): FitInput {
  const drawn = common(random, random.next() < 0.4);
  const { rate, rising, capThicknessNm, parameters } = drawn;
  const profile = random.pick(['sharp', 'graded', 'graded'] as const);
  const edgeDepthNm = random.between(0, DEEPEST_EDGE_NM - capThicknessNm);
  const edgeWidthNm = random.next() < 0.25 ? 0 : logBetween(random, 1, 60);
  if (random.next() < 0.1) parameters.edgeDepthNm = freeWith(edgeDepthNm * 1.1, 10);
  const input: FitInput = {
    ...(rate ? rateInput() : fractionInput()),
    profile,
    polarity: rising === rate ? 'depletion' : 'accumulation',
  };
  return measured(drawn, input, {
    edgeDepthNm,
    edgeWidthNm: profile === 'sharp' ? 0 : edgeWidthNm,
  });
}

/** Layers with both edges free, with one or both of them held sharp, and now and then of known thickness. */
function layerScan(random: Random): FitInput {
  const drawn = common(random, random.next() < 0.4);
  const { rate, rising, capThicknessNm, parameters } = drawn;
  const width = (): number => (random.next() < 0.25 ? 0 : logBetween(random, 1, 40));
  const values = {
    edgeDepthNm: random.between(0, 200 - capThicknessNm),
    edgeWidthNm: width(),
    layerThicknessNm: logBetween(random, 5, 150),
    farEdgeWidthNm: width(),
  };
  const held = random.pick(['neither', 'neither', 'near', 'far', 'both'] as const);
  if (held === 'near' || held === 'both') parameters.edgeWidthNm = heldAt(0);
  if (held === 'far' || held === 'both') parameters.farEdgeWidthNm = heldAt(0);
  if (random.next() < 0.1) parameters.edgeDepthNm = freeWith(values.edgeDepthNm * 1.1, 10);
  if (random.next() < 0.1) parameters.layerThicknessNm = heldAt(random.pick([20, 60]));
  else if (random.next() < 0.1)
    parameters.layerThicknessNm = freeWith(values.layerThicknessNm * 0.9, 8);
  const input: FitInput = {
    ...(rate ? rateInput() : fractionInput()),
    profile: 'layer',
    polarity: rising === rate ? 'depletion' : 'accumulation',
  };
  return measured(drawn, input, {
    ...values,
    edgeWidthNm: parameters.edgeWidthNm ? 0 : values.edgeWidthNm,
    farEdgeWidthNm: parameters.farEdgeWidthNm ? 0 : values.farEdgeWidthNm,
  });
}

/** The bands of a doped germanium-like crystal, bent either way, with the doping held or with a prior. */
function bentScan(random: Random): FitInput {
  const rate = random.next() < 0.5;
  const saturating = !rate && random.next() < 0.5;
  const accumulated = (rate || saturating) && random.next() < 0.4;
  const drawn = common(random, rate);
  const { parameters } = drawn;
  const bulkPerCm3 = random.pick([2e15, 2e16, 2e17]);
  const share = random.pick([0.1, 0.3]);
  if (random.next() < 0.5) parameters.bulkPerCm3 = freeWith(bulkPerCm3, share * bulkPerCm3);
  const input: FitInput = {
    ...(rate ? rateInput() : fractionInput()),
    profile: 'band-bending',
    polarity: accumulated ? 'accumulation' : 'depletion',
    carriers: { bulkPerCm3, bulkSigmaPerCm3: null, topPerCm3: null },
    semiconductor: {
      relativePermittivity: 16.2,
      temperatureK: 200,
      intrinsicPerCm3: random.next() < 0.7 ? 1e10 : null,
    },
    ...(saturating
      ? { response: { kind: 'saturating-fraction', halfPerCm3: 1e15, halfSigmaPerCm3: null } }
      : {}),
  };
  const { lower, upper } = prepareFit({ ...input, capThicknessNm: drawn.capThicknessNm }).problem
    .model;
  const most = accumulated ? lower[0]! : upper[0]!;
  return measured(drawn, input, {
    surfacePotentialEv: most * logBetween(random, 0.02, 1),
    bulkPerCm3,
    ...(rate && !parameters.levelTop ? { levelTop: 0.01 } : {}),
  });
}

function saturatingScan(random: Random): FitInput {
  const drawn = common(random, false);
  const { capThicknessNm, parameters } = drawn;
  const accumulated = random.next() < 0.4;
  const [many, half] = random.pick([
    [1e17, 1e15],
    [1e16, 4e15],
    [1e17, 1e14],
  ] as const);
  const edgeDepthNm = random.between(0, DEEPEST_EDGE_NM - capThicknessNm);
  if (random.next() < 0.1) parameters.edgeDepthNm = freeWith(edgeDepthNm * 1.1, 10);
  const input: FitInput = {
    ...fractionInput(),
    polarity: accumulated ? 'accumulation' : 'depletion',
    carriers: {
      bulkPerCm3: accumulated ? half / 10 : many,
      bulkSigmaPerCm3: null,
      topPerCm3: accumulated ? many : null,
    },
    response: { kind: 'saturating-fraction', halfPerCm3: half, halfSigmaPerCm3: null },
  };
  return measured(drawn, input, {
    edgeDepthNm,
    edgeWidthNm: random.next() < 0.25 ? 0 : logBetween(random, 1, 60),
  });
}

/** The scan itself: the truth folded, with noise of one σ, of uneven σ or of a full covariance. */
function measured(drawn: Common, input: FitInput, shape: ParameterValues): FitInput {
  const { random, low, contrast, sigma, capThicknessNm, parameters } = drawn;
  const points = input.points.map((point) => ({ ...point, sigma }));
  if (random.next() < 0.3)
    for (const point of points) point.sigma = sigma * random.between(0.7, 1.5);
  const covariance = random.next() < 0.2 ? sharedError(points, random) : null;
  const complete: FitInput = { ...input, points, covariance, capThicknessNm, parameters };
  const values = { ...levelsOf(drawn), levelCap: low + contrast / 2, ...shape };
  const truth: FitInput = {
    ...complete,
    profile: input.profile === 'sharp' ? 'graded' : input.profile,
    parameters: input.profile === 'band-bending' ? { bulkPerCm3: free } : {},
  };
  const seed = Math.floor(random.between(0, 1e9));
  return { ...complete, points: simulateScan({ input: truth, values, seed }) };
}

/** V of points that share an error: what two of them share falls with their distance. */
function sharedError(points: FitInput['points'], random: Random): number[][] {
  const rho = random.between(0.1, 0.9);
  const fall = random.between(0.5, 1);
  return points.map((a, i) =>
    points.map((b, j) => a.sigma * b.sigma * (i === j ? 1 : rho * fall ** Math.abs(i - j))),
  );
}

const DRAW: Readonly<Record<RandomKind, (random: Random) => FitInput>> = {
  edge: edgeScan,
  layer: layerScan,
  'band-bending': bentScan,
  saturating: saturatingScan,
};

/**
 * One random scan of a kind: fraction or rate, either polarity, signal to noise 3 to 300, edges inside or outside reach, sharp
 * and graded, priors, held levels, a cap, a free depth scale, a full covariance.
 */
export function randomScan(kind: RandomKind, seed: number): FitInput {
  return DRAW[kind](uniforms(1000 + seed));
}
