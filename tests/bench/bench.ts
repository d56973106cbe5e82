/**
 * Benchmark of the inversion on one thread, beside general-purpose libraries on the same scans: medians over runs that cycle
 * through twenty simulated scans of 13 energies × 320 bins, graded edge, after a warm-up.
 *
 *   npm run bench            a table with ratios
 *   npm run bench -- --json  {"cases": [{"name", "oursMs", "peers": {NAME: ms}}]}
 */
import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import {
  fit,
  foldCurve,
  foldScan,
  prepareFit,
  resample,
  simulateScan,
  type FitAnswer,
  type FitInput,
  type PreparedFit,
} from '@/lib/inversion/index';
import { fractionInput } from '../inversion/support/scans';

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
  return [
    {
      name: 'graded-full',
      what: 'prepare, search, polish, covariance, 68 and 95 % intervals of depth and width',
      oursMs: fullMs,
      peers: pick(ms, ['iminuit-minos', 'lmfit-interval', 'iminuit-hesse', 'scipy-lm']),
    },
    {
      name: 'graded-refit',
      what: 'one resample: draw, search, polish',
      oursMs: refitMs / 10,
      peers: pick(ms, ['scipy-lm', 'lmfit', 'iminuit-hesse']),
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
}
