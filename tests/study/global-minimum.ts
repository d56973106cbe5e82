/**
 * The minimum of the fit beside brute force over 1,000 random scans (tests/inversion/support): how often it lies higher, as Markdown.
 *
 *   npm run global-minimum-study                       seeds 0 to 999, four kinds
 *   npm run global-minimum-study -- layer 450 480      one kind, seeds from and up to
 */
import { fit, prepareFit } from '@/lib/inversion/index';
import { bruteForce } from '../inversion/support/brute-force';
import { RANDOM_KINDS, randomScan, type RandomKind } from '../inversion/support/random-scans';

/** First seed and the one after the last of each kind. */
const SEEDS: Readonly<Record<RandomKind, readonly [number, number]>> = {
  edge: [0, 450],
  layer: [450, 750],
  'band-bending': [750, 900],
  saturating: [900, 1000],
};
const ALLOWED = 0.01;

interface Result {
  seed: number;
  /** χ² of the fit minus that of brute force; null where the fit says that there is no minimum. */
  excess: number | null;
  /** Where there is no minimum, how much brute force says that χ² changes. */
  spread: number | null;
  fitMs: number;
  bruteMs: number;
}

function resultOf(kind: RandomKind, seed: number): Result {
  const input = randomScan(kind, seed);
  const from = performance.now();
  const prepared = prepareFit(input);
  const outcome = fit(prepared, { intervalsFor: [] });
  const fitMs = performance.now() - from;
  const brute = bruteForce(prepared);
  const { chiSquare, at } = brute;
  const bruteMs = performance.now() - from - fitMs;
  const spread = outcome.status === 'no-minimum' ? brute.spread() : null;
  const excess = outcome.status === 'no-minimum' ? null : outcome.answer.chiSquare - chiSquare;
  if (excess !== null && Math.abs(excess) > ALLOWED) {
    const where = outcome.status === 'no-minimum' ? [] : outcome.answer.parameters;
    console.error(
      `${kind} ${seed}: ${excess.toFixed(4)} of ${chiSquare.toFixed(3)}, brute force at ${JSON.stringify(at)}, fit at ${where.map(({ name, value, held }) => `${name}${held ? '!' : ''} ${value.toPrecision(5)}`).join(', ')}`,
    );
  }
  return { seed, excess, spread, fitMs, bruteMs };
}

function rowOf(kind: RandomKind, results: readonly Result[]): string {
  const fitted = results.flatMap(({ seed, excess }) => (excess === null ? [] : [{ seed, excess }]));
  const none = results.filter(({ excess }) => excess === null);
  const above = fitted.filter(({ excess }) => excess > ALLOWED);
  const below = fitted.filter(({ excess }) => excess < -ALLOWED);
  const worst = Math.max(...fitted.map(({ excess }) => excess));
  const median = (values: number[]): number =>
    values.sort((a, b) => a - b)[Math.floor(values.length / 2)]!;
  return `| ${[
    kind,
    `${results[0]!.seed} to ${results.at(-1)!.seed}`,
    results.length,
    above.length,
    above.map(({ seed }) => seed).join(' ') || 'none',
    worst.toExponential(1),
    below.length,
    none.length,
    none.length > 0 ? Math.max(...none.map(({ spread }) => spread!)).toFixed(2) : '',
    median(results.map(({ fitMs }) => fitMs)).toFixed(1),
    median(results.map(({ bruteMs }) => bruteMs)).toFixed(0),
  ].join(' | ')} |`;
}

const [only, first, end] = process.argv.slice(2);
const kinds = RANDOM_KINDS.filter((kind) => !only || kind === only);
console.log(`| kind | seeds | scans | above by > ${ALLOWED} | which | worst | brute force above by > ${ALLOWED} | no minimum | largest spread of those | fit, ms | brute force, ms |
|---|---|---|---|---|---|---|---|---|---|---|`);
for (const kind of kinds) {
  const from = Number(first ?? SEEDS[kind][0]);
  const to = Number(end ?? SEEDS[kind][1]);
  const seeds = Array.from({ length: to - from }, (_, k) => from + k);
  console.log(
    rowOf(
      kind,
      seeds.map((seed) => resultOf(kind, seed)),
    ),
  );
}
