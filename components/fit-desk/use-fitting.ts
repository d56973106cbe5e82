'use client';

import { useCallback, useReducer, useRef } from 'react';

import type { InversionPool, Run } from '@/workers/pool';
import type { FitInput } from '@/lib/inversion/index';

import { fitting, NOTHING_FITTED, type Fitting } from './fitting';

export interface FittingInHand extends Fitting {
  start: (question: { key: string; input: FitInput; seed: number; resamples: number }) => void;
  stop: () => void;
}

/** Runs fits in the pool, one at a time: a new one stops the one before. */
export function useFitting(poolOf: () => InversionPool): FittingInHand {
  const [state, dispatch] = useReducer(fitting, NOTHING_FITTED);
  const current = useRef<{ number: number; run: Run | null }>({ number: 0, run: null });

  const start = useCallback<FittingInHand['start']>(
    ({ key, input, seed, resamples }) => {
      current.current.run?.stop();
      const number = current.current.number + 1;
      dispatch({ type: 'started', run: number });
      const run = poolOf().run(
        { input, seed, resamples },
        {
          onFirst: (first, elapsedMs) =>
            dispatch({ type: 'first', run: number, key, input, first, elapsedMs }),
          onProgress: (progress) => dispatch({ type: 'progress', run: number, progress }),
        },
      );
      current.current = { number, run };
      void run.end.then((end) => {
        if (end.status === 'done')
          dispatch({ type: 'done', run: number, bands: end.bands, elapsedMs: end.elapsedMs });
        if (end.status === 'stopped') dispatch({ type: 'stopped', run: number });
        if (end.status === 'refused')
          dispatch({ type: 'refused', run: number, code: end.code, message: end.message });
      });
    },
    [poolOf],
  );
  const stop = useCallback(() => current.current.run?.stop(), []);
  return { ...state, start, stop };
}
