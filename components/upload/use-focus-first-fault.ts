'use client';

import { useEffect, useRef, type RefObject } from 'react';

/** Takes the reader to the first field at fault inside an element, each time faults come back. */
export function useFocusFirstFault<T extends HTMLElement>(
  faults: Record<string, string>,
): RefObject<T | null> {
  const element = useRef<T>(null);
  useEffect(() => {
    if (Object.keys(faults).length === 0) return;
    element.current?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus();
  }, [faults]);
  return element;
}
