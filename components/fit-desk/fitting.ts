import type { CarrierProfile, Check, FitInput } from '@/lib/inversion/index';
import type { Progress } from '@/workers/pool';
import type { BandedAnswer, FirstAnswer } from '@/workers/protocol';

/** The last result that came back whole, with the question it answers. */
export interface GoodResult {
  /** Stands for the assumptions and data it came from; another key means out of date. */
  key: string;
  input: FitInput;
  first: FirstAnswer;
  profile: CarrierProfile;
  checks: readonly Check[];
  /** The bands are final: from resampling, or none were asked for. */
  complete: boolean;
  elapsedMs: number;
}

export interface Fitting {
  /** Number of the run under way; null when none is. */
  run: number | null;
  progress: Progress | null;
  good: GoodResult | null;
  refusal: { code: string; message: string } | null;
  /** The last run was stopped before its bands came. */
  stopped: boolean;
}

export const NOTHING_FITTED: Fitting = {
  run: null,
  progress: null,
  good: null,
  refusal: null,
  stopped: false,
};

export type FittingEvent = { run: number } & (
  | { type: 'started' }
  | { type: 'first'; key: string; input: FitInput; first: FirstAnswer; elapsedMs: number }
  | { type: 'progress'; progress: Progress }
  | { type: 'done'; bands: BandedAnswer | null; elapsedMs: number }
  | { type: 'stopped' }
  | { type: 'refused'; code: string; message: string }
);

/** What a run says, taken in; a run that was overtaken by another is not heard. The last good result stays until a new one is there. */
export function fitting(state: Fitting, event: FittingEvent): Fitting {
  if (event.type === 'started')
    return { ...state, run: event.run, progress: null, refusal: null, stopped: false };
  if (event.run !== state.run) return state;
  switch (event.type) {
    case 'first': {
      const { key, input, first, elapsedMs } = event;
      const good = {
        key,
        input,
        first,
        profile: first.profile,
        checks: first.checks,
        complete: false,
        elapsedMs,
      };
      return { ...state, good };
    }
    case 'progress':
      return { ...state, progress: event.progress };
    case 'done':
      return {
        ...state,
        run: null,
        progress: null,
        good: state.good && {
          ...state.good,
          ...event.bands,
          complete: true,
          elapsedMs: event.elapsedMs,
        },
      };
    case 'stopped':
      return { ...state, run: null, progress: null, stopped: true };
    case 'refused':
      return {
        ...state,
        run: null,
        progress: null,
        refusal: { code: event.code, message: event.message },
      };
  }
}
