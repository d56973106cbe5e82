import { transfer } from 'comlink';

import type { FitInput } from '@/lib/inversion/index';

import { mergeBlocks, splitIntoBlocks } from './blocks';
import { HandEnded, type Hand } from './hand';
import { workersFor } from './pool-size';
import type { BandedAnswer, FirstAnswer, Reply } from './protocol';

export interface FitRequest {
  input: FitInput;
  seed: number;
  /** Resamples for the bands; 0 leaves the delta-method bands of the first answer. */
  resamples: number;
}

export interface Progress {
  done: number;
  total: number;
  elapsedMs: number;
}

export interface RunListener {
  onFirst(first: FirstAnswer, elapsedMs: number): void;
  onProgress(progress: Progress): void;
}

export type RunEnd =
  | { status: 'done'; bands: BandedAnswer | null; elapsedMs: number }
  | { status: 'stopped'; elapsedMs: number }
  | { status: 'refused'; code: string; message: string };

export interface Run {
  end: Promise<RunEnd>;
  /** Takes effect at once for the caller; a worker that does not let go within 80 ms is ended. */
  stop(): void;
}

export interface InversionPool {
  size: number;
  run(request: FitRequest, listener: RunListener): Run;
  /** First answers of several inputs, in their order. */
  fitEach(inputs: readonly FitInput[]): Promise<Reply<FirstAnswer>[]>;
  /** Ends all workers; waiting calls end with them. */
  end(): void;
}

const PROGRESS_EVERY_MS = 100;
const PATIENCE_MS = 80;

/** Fits on the first worker and resamples on all; workers start when they are first needed. */
export function createPool({ size, spawn }: { size: number; spawn: () => Hand }): InversionPool {
  const hands: (Hand | null)[] = Array.from({ length: size }, () => null);
  let lastJob = 0;
  let closed = false;

  const handAt = (index: number): Hand => {
    if (closed) throw new HandEnded('The pool was ended.');
    const present = hands[index];
    // A worker that failed is not asked again: the next call starts a new one.
    if (present && !present.failed) return present;
    return (hands[index] = spawn());
  };

  /** Closes a job everywhere; with patience, ends the workers that do not answer in time. */
  const letGo = async (job: number, patienceMs: number | null): Promise<void> => {
    const present = hands.filter((hand) => hand !== null && !hand.failed);
    await Promise.all(
      present.map((hand) => {
        const patience =
          patienceMs === null ? undefined : setTimeout(() => hand?.end(), patienceMs);
        const forget = () => clearTimeout(patience);
        return hand?.ask((api) => api.close(job)).then(forget, forget);
      }),
    );
  };
  /** Until then a stopped job may still cost its workers their life, so the next job waits for it. */
  let settled: Promise<void> = Promise.resolve();

  /** A stop may end a worker that was busy with this fit: the fit then goes to the worker that replaces it. */
  const fitOn = async (index: number, input: FitInput): Promise<Reply<FirstAnswer>> => {
    await settled;
    const job = ++lastJob;
    try {
      const hand = handAt(index);
      const answer = await hand.ask((api) => api.fit(job, input));
      await hand.ask((api) => api.close(job));
      return answer;
    } catch (error) {
      if (closed || !(error instanceof HandEnded)) throw error;
      return fitOn(index, input);
    }
  };

  return {
    size,
    run(request, listener) {
      const job = ++lastJob;
      const started = performance.now();
      const elapsed = () => performance.now() - started;
      let over = false;
      let stop = () => {};
      const stopped = new Promise<RunEnd>((resolve) => {
        stop = () => {
          if (over) return;
          over = true;
          resolve({ status: 'stopped', elapsedMs: elapsed() });
          settled = Promise.all([settled, letGo(job, PATIENCE_MS)]).then(() => {});
        };
      });
      const context = { job, request, listener, handAt, size, elapsed, isOver: () => over };
      const work = settled.then(() => runJob(context));
      const end = Promise.race([stopped, work]).then((result) => {
        if (!over) void letGo(job, null);
        over = true;
        return result;
      });
      return { end, stop };
    },
    fitEach: (inputs) => Promise.all(inputs.map((input, index) => fitOn(index % size, input))),
    end() {
      closed = true;
      hands.forEach((hand) => hand?.end());
    },
  };
}

interface JobContext {
  job: number;
  request: FitRequest;
  listener: RunListener;
  handAt: (index: number) => Hand;
  size: number;
  elapsed: () => number;
  isOver: () => boolean;
}

async function runJob(context: JobContext): Promise<RunEnd> {
  const { job, request, listener, handAt, elapsed, isOver } = context;
  try {
    const lead = handAt(0);
    const first = await lead.ask((api) => api.fit(job, request.input));
    if (!first.ok) return { status: 'refused', code: first.code, message: first.message };
    if (isOver()) return { status: 'stopped', elapsedMs: elapsed() };
    listener.onFirst(first.value, elapsed());
    const nothingFree = first.value.answer.parameters.every((parameter) => parameter.held);
    if (request.resamples === 0 || nothingFree)
      return { status: 'done', bands: null, elapsedMs: elapsed() };
    const rows = await resampleOnAll(context, first.value);
    const bands = await lead.ask((api) => api.bands(job, transfer(rows, [rows.buffer])));
    if (!bands.ok) return { status: 'refused', code: bands.code, message: bands.message };
    return { status: 'done', bands: bands.value, elapsedMs: elapsed() };
  } catch (error) {
    if (error instanceof Refused)
      return { status: 'refused', code: error.code, message: error.message };
    if (isOver() || error instanceof HandEnded) return { status: 'stopped', elapsedMs: elapsed() };
    const message = error instanceof Error ? error.message : String(error);
    return { status: 'refused', code: 'worker', message };
  }
}

class Refused extends Error {
  constructor(
    readonly code: string,
    message: string,
  ) {
    super(message);
  }
}

/** Every worker takes the next block until none is left; rows are put in order at the end. */
async function resampleOnAll(context: JobContext, first: FirstAnswer): Promise<Float64Array> {
  const { job, request, listener, handAt, size, elapsed, isOver } = context;
  const blocks = splitIntoBlocks(request.resamples, request.seed);
  const parts: { first: number; count: number; rows: Float64Array }[] = [];
  let next = 0;
  let done = 0;
  let reported = -Infinity;

  const workThrough = async (index: number): Promise<void> => {
    const hand = handAt(index);
    if (index > 0) valueOf(await hand.ask((api) => api.adopt(job, request.input, first.answer)));
    for (let block = blocks[next++]; block && !isOver(); block = blocks[next++]) {
      const taken = block;
      const rows = valueOf(await hand.ask((api) => api.resample(job, taken)));
      if (rows === null || isOver()) return;
      parts.push({ first: taken.first, count: taken.count, rows });
      done += taken.count;
      if (elapsed() - reported < PROGRESS_EVERY_MS && done < request.resamples) continue;
      reported = elapsed();
      listener.onProgress({ done, total: request.resamples, elapsedMs: reported });
    }
  };

  const workers = Math.min(workersFor(size, request.input.stopping), blocks.length);
  await Promise.all(Array.from({ length: workers }, (_, index) => workThrough(index)));
  if (isOver()) throw new HandEnded('Stopped.');
  return mergeBlocks(parts, request.resamples);
}

function valueOf<T>(reply: Reply<T>): T {
  if (reply.ok) return reply.value;
  throw new Refused(reply.code, reply.message);
}
