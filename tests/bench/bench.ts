/**
 * Benchmark of the inversion on one thread, beside general-purpose libraries on the same scans: medians over runs that cycle
 * through twenty simulated scans of 13 energies × 320 bins, graded edge, after a warm-up. All share one stopping set, which is
 * compiled once for everybody: the peers get their matrices ready made.
 *
 *   npm run bench            a table with ratios, and how the time grows with energies and bins
 *   npm run bench -- --json  {"cases": [{"name", "oursMs", "peers": {NAME: ms}}]}
 */
import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import {
  carrierProfile,
  fit,
  foldCurve,
  foldScan,
  prepareFit,
  prepareFreeForm,
  resample,
  runChecks,
  simulateScan,
  solveFreeForm,
  type FitAnswer,
  type FitInput,
  type PreparedFit,
} from '@/lib/inversion/index';
import { fractionInput, rateInput, stoppingSet } from '../inversion/support/scans';

interface Case {
  name: string;
  /** What one run does, for the table. */
  what: string;
  oursMs: number;
  peers: Record<string, number>;
}

const SCANS = 20;
const SIGMA = 0.005;
const TRUTH = { edgeDepthNm: 78, edgeWidthNm: 16, levelTop: 0.74, levelBulk: 0.32 };
const PYTHON = '/usr/bin/python3';

function medianMs(runs: number, warmUp: number, run: (k: number) => void): number {
  for (let k = 0; k < warmUp; k++) run(k);
  const times: number[] = [];
  for (let k = 0; k < runs; k++) {
    const from = performance.now();
    run(k);
    times.push(performance.now() - from);
  }
  return times.sort((a, b) => a - b)[Math.floor(times.length / 2)]!;
}

const template = fractionInput({}, SIGMA);
const inputs: FitInput[] = Array.from({ length: SCANS }, (_, seed) => ({
  ...template,
  points: simulateScan({ input: template, values: TRUTH, seed }),
}));

function fitted(input: FitInput): { prepared: PreparedFit; answer: FitAnswer } {
  const prepared = prepareFit(input);
  const outcome = fit(prepared);
  if (outcome.status === 'no-minimum') throw new Error(outcome.reason);
  return { prepared, answer: outcome.answer };
}

const rates = rateInput({}, 0.04);
const RATE_TRUTH = { ...TRUTH, levelTop: 0.1, levelBulk: 2 };
const freeFormInputs = Array.from({ length: SCANS }, (_, seed) => ({
  ...rates,
  difference: 2 as const,
  monotonic: 'no' as const,
  points: simulateScan({ input: rates, values: RATE_TRUTH, seed }),
}));

const ready = inputs.map(fitted);
const curveKeV = Array.from({ length: 60 }, (_, k) => 2 + k / 3);

function peersOf(): { ms: Record<string, number>; versions: Record<string, string> } {
  if (!existsSync(PYTHON)) return { ms: {}, versions: {} };
  const { profiles } = template.stopping;
  const task = {
    edgesNm: [...profiles[0]!.edgesNm],
    mass: profiles.map(({ mass }) => [...mass]),
    scans: inputs.map(({ points }) => points.map(({ value }) => value)),
    sigma: SIGMA,
    start: [70, 12, 0.7, 0.35],
    repeats: 100,
  };
  const script = fileURLToPath(new URL('peers.py', import.meta.url));
  const { status, stdout, stderr } = spawnSync(PYTHON, [script], {
    input: JSON.stringify(task),
    encoding: 'utf8',
  });
  if (status !== 0) {
    console.error(
      `The peers could not be timed: ${stderr.trim().split('\n').pop() ?? 'no reason given'}`,
    );
    return { ms: {}, versions: {} };
  }
  return JSON.parse(stdout) as { ms: Record<string, number>; versions: Record<string, string> };
}

function pick(ms: Record<string, number>, names: readonly string[]): Record<string, number> {
  return Object.fromEntries(
    names.flatMap((name) => (ms[name] === undefined ? [] : [[name, ms[name]]])),
  );
}

function measure(ms: Record<string, number>): Case[] {
  const fullMs = medianMs(400, 300, (k) => {
    fit(prepareFit(inputs[k % SCANS]!), { intervalsFor: ['edgeDepthNm', 'edgeWidthNm'] });
  });
  const firstMs = medianMs(100, 50, (k) => {
    const input = inputs[k % SCANS]!;
    const stopping = { profiles: [...input.stopping.profiles] };
    fit(prepareFit({ ...input, stopping }), { intervalsFor: ['edgeDepthNm', 'edgeWidthNm'] });
  });
  const refitMs = medianMs(100, 50, (k) => {
    const { prepared, answer } = ready[k % SCANS]!;
    resample(prepared, answer, { seed: k, first: 0, count: 10 });
  });
  const frameMs = medianMs(1000, 500, (k) => {
    const values = { ...TRUTH, edgeDepthNm: 60 + (k % 40) };
    foldScan(ready[0]!.prepared, values);
    foldCurve(ready[0]!.prepared, values, curveKeV);
  });
  const resampleMs = medianMs(5, 1, (k) => {
    const { prepared, answer } = ready[k % SCANS]!;
    resample(prepared, answer, { seed: k, first: 0, count: 2000 });
  });
  const freeFormMs = medianMs(60, 20, (k) => {
    solveFreeForm(prepareFreeForm(freeFormInputs[k % SCANS]!));
  });
  const checksMs = medianMs(40, 20, (k) => {
    const { prepared, answer } = ready[k % SCANS]!;
    runChecks(prepared, answer, carrierProfile(prepared, answer));
  });
  return [
    {
      name: 'graded-full',
      what: 'prepare, search, polish, covariance, 68 and 95 % intervals of depth and width',
      oursMs: fullMs,
      peers: pick(ms, ['iminuit-minos', 'lmfit-interval', 'iminuit-hesse', 'scipy-lm']),
    },
    {
      name: 'graded-first',
      what: 'the same with a stopping set not seen before: its kernel and the folds of the search are made too',
      oursMs: firstMs,
      peers: pick(ms, ['iminuit-minos', 'lmfit-interval']),
    },
    {
      name: 'graded-refit',
      what: 'one resample: draw, search, polish',
      oursMs: refitMs / 10,
      peers: pick(ms, ['scipy-lm', 'lmfit', 'iminuit-hesse']),
    },
    {
      name: 'free-form',
      what: '40 knots, non-negative, L-curve of 40 points, all three choices of its strength',
      oursMs: freeFormMs,
      peers: {},
    },
    {
      name: 'checks',
      what: 'profile with preview bands and every check',
      oursMs: checksMs,
      peers: {},
    },
    {
      name: 'drag-frame',
      what: 'fold of the scan and of a curve of 60 energies',
      oursMs: frameMs,
      peers: {},
    },
    { name: 'resample-2000', what: '2,000 resamples on one thread', oursMs: resampleMs, peers: {} },
  ];
}

/** One fold with derivatives and one whole fit over the sizes of a scan; the time of a fold over energies × bins. */
function growth(): void {
  console.log('\nenergies    bins     fold ms   fold ns per energy and bin      fit ms');
  for (const [energies, bins] of [
    [13, 320],
    [50, 320],
    [200, 320],
    [13, 1280],
    [13, 5000],
    [13, 20_000],
    [50, 5000],
    [200, 20_000],
  ] as const) {
    const list = Array.from({ length: energies }, (_, k) => 2 + (20 * k) / (energies - 1));
    const base = fractionInput(
      {
        stopping: stoppingSet(list, bins, 320 / bins),
        points: list.map((energyKeV) => ({ energyKeV, value: 0, sigma: SIGMA, enabled: true })),
      },
      SIGMA,
    );
    const input = { ...base, points: simulateScan({ input: base, values: TRUTH, seed: 1 }) };
    const { prepared } = fitted(input);
    const foldMs = medianMs(9, 3, () => foldScan(prepared, TRUTH));
    const fitMs = medianMs(3, 1, () => fit(prepareFit(input)));
    console.log(
      `${String(energies).padStart(8)}${String(bins).padStart(8)}${foldMs.toFixed(4).padStart(12)}${((1e6 * foldMs) / (energies * bins)).toFixed(2).padStart(29)}${fitMs.toFixed(1).padStart(12)}`,
    );
  }
}

const peers = peersOf();
const cases = measure(peers.ms);
if (process.argv.includes('--json')) {
  console.log(
    JSON.stringify({
      cases: cases.map(({ name, oursMs, peers: timed }) => ({ name, oursMs, peers: timed })),
    }),
  );
} else {
  console.log(
    `Node ${process.version}, one thread, medians. Peers: ${
      Object.entries(peers.versions)
        .map(([name, v]) => `${name} ${v}`)
        .join(', ') || 'none installed'
    }.`,
  );
  for (const { name, what, oursMs, peers: timed } of cases) {
    console.log(`\n${name.padEnd(16)} ${oursMs.toFixed(3).padStart(9)} ms   ${what}`);
    for (const [peer, ms] of Object.entries(timed)) {
      console.log(
        `  ${peer.padEnd(14)} ${ms.toFixed(3).padStart(9)} ms   ${(ms / oursMs).toFixed(1)} × ours`,
      );
    }
  }
  growth();
}
