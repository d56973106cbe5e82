import { transfer } from 'comlink';

import {
  bootstrapBands,
  carrierProfile,
  defaultDepthGrid,
  depthInformation,
  edgeInformationByEnergy,
  fit,
  InversionError,
  prepareFit,
  resample,
  runChecks,
  type Check,
  type FitAnswer,
  type FitInput,
  type PreparedFit,
} from '@/lib/inversion/index';

import { breathe } from './breathe';
import type { FirstAnswer, InversionApi, Reply, ResampleBlock } from './protocol';

/** A stop is seen at least this often, ms. */
const BREATH_MS = 40;
/** Rows between two looks at the clock: few at first, and twice as many while a slice takes next to no time. */
const FIRST_SLICE = 5;
const QUICK_MS = 4;

interface Job {
  prepared: PreparedFit;
  answer: FitAnswer;
  /** Of the worker that fitted: no check depends on the bands. */
  checks: readonly Check[];
}

/** The work of one worker, without the thread round it. */
export function createInversionService(): InversionApi {
  const jobs = new Map<number, Job>();
  const jobOf = (id: number): Job => {
    const job = jobs.get(id);
    if (!job)
      throw new InversionError(
        'unknown-job',
        'This fit is no longer open in the worker; start it again.',
      );
    return job;
  };
  return {
    hello: async () => 'ready',
    fit: async (id, input) =>
      reply(() => {
        const prepared = prepareFit(input);
        const outcome = fit(prepared);
        if (outcome.status === 'no-minimum') throw new InversionError('no-minimum', outcome.reason);
        const first = firstAnswer(prepared, outcome.answer);
        jobs.set(id, { prepared, answer: outcome.answer, checks: first.checks });
        return first;
      }),
    adopt: async (id, input: FitInput, answer) =>
      reply(() => {
        jobs.set(id, { prepared: prepareFit(input), answer, checks: [] });
        return 'ready' as const;
      }),
    resample: async (id, block) => {
      try {
        const rows = await resampleBreathing(jobOf(id), block, () => jobs.has(id));
        const answer = { ok: true as const, value: rows };
        return rows ? transfer(answer, [rows.buffer]) : answer;
      } catch (error) {
        return refusal(error);
      }
    },
    bands: async (id, rows) =>
      reply(() => {
        const { prepared, answer, checks } = jobOf(id);
        const depthsNm = defaultDepthGrid(prepared, answer);
        const bands = bootstrapBands(prepared, answer, rows, depthsNm);
        const profile = carrierProfile(prepared, answer, bands, { depthsNm: Array.from(depthsNm) });
        return { profile, checks: [...checks] };
      }),
    close: async (id) => {
      jobs.delete(id);
    },
  };
}

function firstAnswer(prepared: PreparedFit, answer: FitAnswer): FirstAnswer {
  const depthsNm = defaultDepthGrid(prepared, answer);
  const profile = carrierProfile(prepared, answer, undefined, { depthsNm: Array.from(depthsNm) });
  return {
    answer,
    profile,
    checks: runChecks(prepared, answer, profile),
    information: { depthsNm, values: depthInformation(prepared, answer, depthsNm) },
    edgeInformation: edgeInformationByEnergy(prepared, answer),
  };
}

/** A block of rows in slices, with a breath in between; null when the job was closed during one. */
async function resampleBreathing(
  { prepared, answer }: Job,
  { seed, first, count }: ResampleBlock,
  open: () => boolean,
): Promise<Float64Array | null> {
  const parts: Float64Array[] = [];
  let breathed = performance.now();
  let slice = FIRST_SLICE;
  for (let done = 0; done < count;) {
    const from = performance.now();
    const rows = Math.min(slice, count - done);
    parts.push(resample(prepared, answer, { seed, first: first + done, count: rows }));
    done += rows;
    if (performance.now() - from < QUICK_MS) slice *= 2;
    if (performance.now() - breathed < BREATH_MS) continue;
    await breathe();
    if (!open()) return null;
    breathed = performance.now();
  }
  return joined(parts);
}

function joined(parts: readonly Float64Array[]): Float64Array {
  const whole = new Float64Array(parts.reduce((length, part) => length + part.length, 0));
  let at = 0;
  for (const part of parts) {
    whole.set(part, at);
    at += part.length;
  }
  return whole;
}

function reply<T>(work: () => T): Reply<T> {
  try {
    return { ok: true, value: work() };
  } catch (error) {
    return refusal(error);
  }
}

function refusal(error: unknown): { ok: false; code: string; message: string } {
  if (error instanceof InversionError)
    return { ok: false, code: error.code, message: error.message };
  const reason = error instanceof Error ? error.message : String(error);
  return { ok: false, code: 'unexpected', message: `The calculation broke off: ${reason}` };
}
