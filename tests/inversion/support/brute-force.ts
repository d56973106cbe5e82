import type { ParameterName, PreparedFit } from '@/lib/inversion/index';
import { LEVELS, phiOf, shareAt } from './phi-by-hand';
import { nelderMead, patternSearch, type Found, type Search } from './try-and-see';

/**
 * Minimum of Φ by trying: a dense lattice over the shape, the levels solved within their bounds, then Nelder-Mead from the best few
 * nodes and from places in between, then a pattern search. Shares only the fold with the library; lattice, level solver, χ² and polish
 * are its own. Bounds and held values are those of the fit: they are the question, not the way to the answer.
 */
export interface BruteForce {
  chiSquare: number;
  /**
   * Largest minus smallest χ² over the first parameter of the shape, each at the best of the others: found on the lattice, and
   * minimised there where the lattice has it largest.
   */
  spread: () => number;
  /** Where: the shape and the depth scale by name. */
  at: Partial<Record<ParameterName, number>>;
}

/** Best nodes of the lattice that are followed, and places away from them. */
const STARTS = 6;
const RESTARTS = 2;

/** Folds of the nodes depend on no datum: scans of one profile, cap and response share them. Share of every point, node by node. */
const folded = new Map<string, Float64Array>();
const MOST_FOLDED = 12;

interface Shape {
  names: readonly ParameterName[];
  lower: number[];
  upper: number[];
  held: boolean[];
  /** Values of the lattice. */
  axes: number[][];
}

export function bruteForce(prepared: PreparedFit): BruteForce {
  const shape = shapeOf(prepared);
  const phi = phiOf(prepared, shape.names);
  const nodes = allNodes(shape.axes);
  const shares = sharesOfNodes(prepared, shape, nodes);
  const count = prepared.input.points.length;
  const values = nodes.map((node, k) => phi(node, shares.subarray(k * count, (k + 1) * count)));
  const free = shape.names.map((_, k) => k).filter((k) => !shape.held[k]);
  const search: Search = { of: (x) => phi(x), free, lower: shape.lower, upper: shape.upper };
  const followed = spreadOut(shape, nodes, values).map((node, order) => {
    const step = stepsAt(shape, nodes[node]!);
    const start = order < STARTS ? nodes[node]! : betweenNodes(shape, nodes[node]!, step);
    return nelderMead(search, start, step);
  });
  const lowest = followed.reduce(lower);
  const steps = stepsAt(shape, lowest.x);
  const again = nelderMead(
    search,
    lowest.x,
    steps.map((step) => step / 4),
  );
  const best = patternSearch(
    search,
    lower(lowest, again),
    steps.map((step) => step / 8),
  );
  return {
    chiSquare: best.value,
    spread: () => highestOverFirst(search, shape, nodes, values) - best.value,
    at: Object.fromEntries(shape.names.map((name, k) => [name, best.x[k]!])),
  };
}

const lower = (a: Found, b: Found): Found => (b.value < a.value ? b : a);

function shapeOf(prepared: PreparedFit): Shape {
  const { model } = prepared.problem;
  const at = model.names.map((_, k) => k).filter((k) => !LEVELS.includes(model.names[k]!));
  const names = at.map((k) => model.names[k]!);
  const held = at.map((k) => model.held[k] === 1);
  return {
    names,
    lower: at.map((k) => model.lower[k]!),
    upper: at.map((k) => model.upper[k]!),
    held,
    axes: at.map((k, a) => (held[a] ? [model.neutral[k]!] : axisOf(prepared, model.names[k]!))),
  };
}

const even = (count: number, highest: number): number[] =>
  Array.from({ length: count }, (_, k) => (highest * k) / (count - 1));

function axisOf(
  { input, deepestNm, problem: { model } }: PreparedFit,
  name: ParameterName,
): number[] {
  const layered = input.profile === 'layer';
  const lengths = (count: number, first: number, factor: number): number[] =>
    Array.from({ length: count }, (_, k) => first * factor ** k).filter((x) => x < deepestNm);
  switch (name) {
    case 'edgeDepthNm':
      return even(layered ? 41 : 161, deepestNm);
    case 'layerThicknessNm':
      return lengths(16, 3, 1.36);
    case 'edgeWidthNm':
    case 'farEdgeWidthNm':
      return [0, ...(layered ? lengths(5, 3, 2.4) : lengths(14, 1, 1.55))];
    case 'surfacePotentialEv': {
      const k = model.names.indexOf(name);
      const bound = model.lower[k]! < 0 ? model.lower[k]! : model.upper[k]!;
      return even(120, 1).map((share) => bound * share ** 2);
    }
    case 'bulkPerCm3': {
      const { mean, sigma } = input.parameters.bulkPerCm3!.prior!;
      return [-3, -2, -1, 0, 1, 2, 3].map((k) => mean * Math.exp((k * sigma) / mean));
    }
    case 'depthScale':
      return [input.parameters.depthScale?.prior?.mean ?? 1];
    default:
      throw new Error(`There is no lattice of ${name}.`);
  }
}

function allNodes(axes: number[][]): number[][] {
  return axes.reduce<number[][]>(
    (nodes, axis) => axis.flatMap((value) => nodes.map((node) => [...node, value])),
    [[]],
  );
}

function sharesOfNodes(prepared: PreparedFit, shape: Shape, nodes: number[][]): Float64Array {
  const { profile, capThicknessNm, response, carriers, polarity, semiconductor } = prepared.input;
  const half = response.kind === 'saturating-fraction' ? response.halfPerCm3 : null;
  const key = JSON.stringify([
    profile,
    capThicknessNm,
    half,
    carriers,
    polarity,
    semiconductor,
    shape.axes,
  ]);
  const known = folded.get(key);
  if (known) return known;
  const all = nodes.map((node) => shareAt(prepared, shape.names, node));
  const count = prepared.input.points.length;
  const shares = new Float64Array(nodes.length * count);
  all.forEach((share, k) => shares.set(share, k * count));
  if (folded.size === MOST_FOLDED) folded.delete(folded.keys().next().value!);
  folded.set(key, shares);
  return shares;
}

/** Places of a node on its axes, the first axis changing fastest. */
function placesOf({ axes }: Shape, node: number): number[] {
  let rest = node;
  return axes.map(({ length }) => {
    const place = rest % length;
    rest = (rest - place) / length;
    return place;
  });
}

/** The best nodes, none within two steps of a better one along every axis: so that they lie in different valleys. */
function spreadOut(shape: Shape, nodes: number[][], values: number[]): number[] {
  const order = [...nodes.keys()].sort((a, b) => values[a]! - values[b]!).slice(0, 4000);
  const chosen: number[] = [];
  for (const node of order) {
    const places = placesOf(shape, node);
    const apart = chosen.every((other) =>
      placesOf(shape, other).some((place, k) => Math.abs(place - places[k]!) > 2),
    );
    if (apart) chosen.push(node);
    if (chosen.length === STARTS) break;
  }
  return [...chosen, ...chosen.slice(0, RESTARTS)];
}

/** Steps of about the spacing of the lattice. */
function stepsAt({ names, upper, lower, axes }: Shape, x: readonly number[]): number[] {
  return names.map((name, k) => {
    if (name === 'edgeDepthNm') return upper[k]! / 60;
    if (name === 'depthScale') return 0.01;
    if (name === 'surfacePotentialEv') return (upper[k]! - lower[k]!) / 60 + Math.abs(x[k]!) / 20;
    if (name === 'bulkPerCm3')
      return (axes[k]!.length > 1 ? axes[k]![1]! - axes[k]![0]! : x[k]!) / 2;
    return Math.max(1.5, x[k]! / 4);
  });
}

/** A place away from a node, by a fixed pattern of signs. */
function betweenNodes(shape: Shape, node: readonly number[], step: readonly number[]): number[] {
  return node.map((x, k) =>
    shape.held[k]
      ? x
      : Math.min(
          Math.max(x + (k % 2 === 0 ? 1.4 : -1.4) * step[k]!, shape.lower[k]!),
          shape.upper[k]!,
        ),
  );
}

/** Best node of each value of the first parameter, the highest of them minimised until it is the highest no more. */
function highestOverFirst(
  search: Search,
  shape: Shape,
  nodes: number[][],
  values: number[],
): number {
  const { length } = shape.axes[0]!;
  const lowest = Array.from({ length }, (): Found & { settled: boolean } => ({
    x: [],
    value: Infinity,
    settled: false,
  }));
  values.forEach((value, node) => {
    if (value >= lowest[node % length]!.value) return;
    lowest[node % length] = { x: nodes[node]!, value, settled: false };
  });
  const rest = { ...search, free: search.free.filter((k) => k !== 0) };
  for (;;) {
    const highest = lowest.reduce((a, b) => (b.value > a.value ? b : a));
    if (highest.settled) return highest.value;
    const found = nelderMead(rest, highest.x, stepsAt(shape, highest.x));
    lowest[lowest.indexOf(highest)] = { ...lower(highest, found), settled: true };
  }
}
