'use client';

import { useEffect, useRef, useState } from 'react';

import {
  previewStopping,
  readCached,
  type StoppingPreview,
  type TableCache,
} from './preview-stopping';
import type { StoppingChoices } from './stopping-choices';

/**
 * The preview of the files as chosen. Files are taken apart one at a time with a breath between
 * them, so that the page paints and answers; only what changed is read again. `reading` is true
 * while the preview at hand belongs to earlier choices.
 */
export function useStoppingPreview(choices: StoppingChoices): {
  preview: StoppingPreview | null;
  reading: boolean;
} {
  const cache = useRef<TableCache>(new WeakMap());
  const [done, setDone] = useState<{ choices: StoppingChoices; preview: StoppingPreview } | null>(
    null,
  );
  useEffect(() => {
    const stop = new AbortController();
    void readInTurns(choices, cache.current, stop.signal).then((preview) => {
      if (preview !== null) setDone({ choices, preview });
    });
    return () => stop.abort();
  }, [choices]);
  return { preview: done?.preview ?? null, reading: done?.choices !== choices };
}

async function readInTurns(
  choices: StoppingChoices,
  cache: TableCache,
  stop: AbortSignal,
): Promise<StoppingPreview | null> {
  for (const entry of choices.entries) {
    await breath();
    if (stop.aborted) return null;
    readCached(entry, cache);
  }
  await breath();
  return stop.aborted ? null : previewStopping(choices, cache);
}

/** A timer and not a microtask: only then may the browser paint and take input in between. */
function breath(): Promise<void> {
  return new Promise((resolve) => setTimeout(resolve, 0));
}
