'use client';

import { useEffect, useState } from 'react';

/**
 * The result of a slow computation, made after the page had the chance to paint "Reading…".
 * `reading` is true while the result at hand belongs to earlier inputs. Keep `compute` stable
 * (useCallback) for unchanged inputs: it runs once per identity.
 */
export function useDeferredReading<Result>(compute: () => Result): {
  result: Result | null;
  reading: boolean;
} {
  const [done, setDone] = useState<{ compute: () => Result; result: Result } | null>(null);
  useEffect(() => {
    // A timer after the frame: the browser paints first, then the thread is taken.
    let timer: ReturnType<typeof setTimeout> | undefined;
    const frame = requestAnimationFrame(() => {
      timer = setTimeout(() => setDone({ compute, result: compute() }), 0);
    });
    return () => {
      cancelAnimationFrame(frame);
      clearTimeout(timer);
    };
  }, [compute]);
  return { result: done?.result ?? null, reading: done?.compute !== compute };
}
