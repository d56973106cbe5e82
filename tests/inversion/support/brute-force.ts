import { foldScan, prepareFit, type FitInput, type PreparedFit } from '@/lib/inversion/index';
import { free, heldAt } from './scans';

/**
 * Minimum of Φ by trying: a dense lattice over the edge (and width), the levels by coordinate descent within their bounds, then a
 * pattern search from the best few nodes. Shares only the fold with the library; search, level solver and polish are its own.
 */
export interface BruteForce {
  chiSquare: number;
  /** Largest minus smallest χ² over the depths of the lattice. */
  spread: number;
}

interface Shape {
  edgeDepthNm: number;
  edgeWidthNm: number;
  depthScale: number;
}

const folders = new Map<
  string,
  { prepared: PreparedFit; cap: PreparedFit; memo: Map<string, Float64Array> }
>();

/** Populated share and cap share of every point, read off the fold of a fraction with levels 0 and 1. */
function sharesAt(
  input: FitInput,
  { edgeDepthNm, edgeWidthNm, depthScale }: Shape,
  remember: boolean,
): Float64Array {
  const key = `${input.capThicknessNm}`;
  let folder = folders.get(key);
  if (!folder) {
    const plain: FitInput = {
      ...input,
      profile: 'graded',
      observable: 'fraction',
      response: { kind: 'two-level' },
      parameters: {
        depthScale: free,
        ...(input.capThicknessNm > 0 ? { levelCap: heldAt(0) } : {}),
      },
    };
    folder = { prepared: prepareFit(plain), cap: prepareFit(plain), memo: new Map() };
    folders.set(key, folder);
  }
  const name = `${edgeDepthNm} ${edgeWidthNm} ${depthScale}`;
  const known = folder.memo.get(name);
  if (known) return known;
  const share = foldScan(folder.prepared, {
    edgeDepthNm,
    edgeWidthNm,
    depthScale,
    levelTop: 0,
    levelBulk: 1,
    levelCap: 0,
  });
  const cap =
    input.capThicknessNm > 0
      ? foldScan(folder.prepared, {
          edgeDepthNm,
          edgeWidthNm,
          depthScale,
          levelTop: 0,
          levelBulk: 0,
          levelCap: 1,
        })
      : share.map(() => 0);
  const both = Float64Array.from([...share, ...cap]);
  if (remember) folder.memo.set(name, both);
  return both;
}

function bestLevels(input: FitInput, shares: Float64Array): number {
  const n = input.points.length;
  const low = input.response.kind === 'capture-rate' ? input.response.baselinePerUs : 0;
  const high = input.observable === 'fraction' ? 1 : Infinity;
  const names =
    input.capThicknessNm > 0
      ? (['levelTop', 'levelBulk', 'levelCap'] as const)
      : (['levelTop', 'levelBulk'] as const);
  const size = names.length;
  const column = (k: number, i: number): number =>
    k === 1 ? shares[i]! : k === 2 ? shares[n + i]! : 1 - shares[i]! - shares[n + i]!;
  const gram = new Float64Array(size * size);
  const right = new Float64Array(size);
  let chiSquare = 0;
  for (let i = 0; i < n; i++) {
    const { value, sigma, enabled } = input.points[i]!;
    if (!enabled) continue;
    const weight = 1 / sigma ** 2;
    chiSquare += value * value * weight;
    for (let k = 0; k < size; k++) {
      right[k] = right[k]! + weight * column(k, i) * value;
      for (let l = 0; l < size; l++)
        gram[k * size + l] = gram[k * size + l]! + weight * column(k, i) * column(l, i);
    }
  }
  const levels = new Float64Array(size);
  const held = names.map((name) => input.parameters[name]?.held ?? false);
  names.forEach((name, k) => {
    const setting = input.parameters[name];
    if (setting?.prior && !setting.held) {
      const weight = 1 / setting.prior.sigma ** 2;
      gram[k * size + k] = gram[k * size + k]! + weight;
      right[k] = right[k]! + weight * setting.prior.mean;
      chiSquare += weight * setting.prior.mean ** 2;
    }
    levels[k] = setting?.held ? setting.value! : 0.5;
  });
  for (let sweep = 0; sweep < 400; sweep++) {
    let moved = 0;
    for (let k = 0; k < size; k++) {
      if (held[k] || gram[k * size + k]! < 1e-30) continue;
      let rest = right[k]!;
      for (let l = 0; l < size; l++) if (l !== k) rest -= gram[k * size + l]! * levels[l]!;
      const lowest = k === 2 ? 0 : low;
      const next = Math.min(Math.max(rest / gram[k * size + k]!, lowest), high);
      moved = Math.max(moved, (next - levels[k]!) ** 2 * gram[k * size + k]!);
      levels[k] = next;
    }
    if (moved < 1e-12) break;
  }
  for (let k = 0; k < size; k++) {
    chiSquare -= 2 * right[k]! * levels[k]!;
    for (let l = 0; l < size; l++) chiSquare += gram[k * size + l]! * levels[k]! * levels[l]!;
  }
  return chiSquare;
}

export function bruteForce(input: FitInput, deepestNm: number): BruteForce {
  const { parameters } = input;
  const priors = (['edgeDepthNm', 'edgeWidthNm', 'depthScale'] as const).map((name) => {
    const setting = parameters[name];
    if (!setting || setting.held) return null;
    return {
      name,
      prior: setting.prior ?? (name === 'depthScale' ? { mean: 1, sigma: 0.03 } : null),
    };
  });
  const objective = (shape: Shape, remember = false): number =>
    bestLevels(input, sharesAt(input, shape, remember)) +
    priors.reduce(
      (sum, row) =>
        row?.prior ? sum + ((shape[row.name] - row.prior.mean) / row.prior.sigma) ** 2 : sum,
      0,
    );
  const depths = parameters.edgeDepthNm?.held
    ? [parameters.edgeDepthNm.value!]
    : Array.from({ length: 161 }, (_, k) => (deepestNm * k) / 160);
  const widths =
    input.profile === 'sharp'
      ? [0]
      : parameters.edgeWidthNm?.held
        ? [parameters.edgeWidthNm.value!]
        : [0, ...Array.from({ length: 14 }, (_, k) => 1 * 1.55 ** k)].filter(
            (width) => width < deepestNm,
          );
  const nodes = widths.flatMap((edgeWidthNm) =>
    depths.map((edgeDepthNm) => ({ edgeDepthNm, edgeWidthNm, depthScale: 1 })),
  );
  const values = nodes.map((node) => objective(node, true));
  const perDepth = depths.map((_, k) =>
    Math.min(...widths.map((__, line) => values[line * depths.length + k]!)),
  );
  const order = [...nodes.keys()].sort((a, b) => values[a]! - values[b]!).slice(0, 6);
  const polished = order.map((node) =>
    patternSearch(input, objective, nodes[node]!, values[node]!, deepestNm),
  );
  const chiSquare = Math.min(...polished);
  return { chiSquare, spread: Math.max(...perDepth) - chiSquare };
}

/** Hooke-Jeeves: steps along each axis, halved when none helps. */
function patternSearch(
  input: FitInput,
  objective: (shape: Shape) => number,
  start: Shape,
  startValue: number,
  deepestNm: number,
): number {
  const steps: Partial<Shape> = {};
  if (!input.parameters.edgeDepthNm?.held) steps.edgeDepthNm = deepestNm / 200;
  if (input.profile === 'graded' && !input.parameters.edgeWidthNm?.held)
    steps.edgeWidthNm = Math.max(1, start.edgeWidthNm / 4);
  if (input.capThicknessNm > 0 && input.parameters.depthScale && !input.parameters.depthScale.held)
    steps.depthScale = 0.01;
  let at = start;
  let value = startValue;
  for (let halving = 0; halving < 16; halving++) {
    for (let moved = true, tries = 0; moved && tries < 40; tries++) {
      moved = false;
      for (const [name, step] of Object.entries(steps)) {
        for (const sign of [-1, 1]) {
          const next = { ...at, [name]: at[name as keyof Shape] + (sign * step) / 2 ** halving };
          if (
            next.edgeDepthNm < 0 ||
            next.edgeDepthNm > deepestNm ||
            next.edgeWidthNm < 0 ||
            next.edgeWidthNm > deepestNm
          )
            continue;
          const there = objective(next);
          if (there < value) {
            at = next;
            value = there;
            moved = true;
            break;
          }
        }
      }
    }
  }
  return value;
}
