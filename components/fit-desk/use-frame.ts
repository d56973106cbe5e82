'use client';

import { useCallback, useEffect, useRef } from 'react';

/** Calls with the latest value at most once per frame: a pointer reports more often than the screen draws. */
export function useFrame<T>(use: (value: T) => void): (value: T) => void {
  const waiting = useRef<{ frame: number; value: T } | null>(null);
  useEffect(
    () => () => {
      if (waiting.current) cancelAnimationFrame(waiting.current.frame);
      waiting.current = null;
    },
    [],
  );
  return useCallback(
    (value: T) => {
      if (waiting.current) {
        waiting.current.value = value;
        return;
      }
      const frame = requestAnimationFrame(() => {
        const latest = waiting.current?.value ?? value;
        waiting.current = null;
        use(latest);
      });
      waiting.current = { frame, value };
    },
    [use],
  );
}
