'use client';

import { useEffect, useRef, useState, type RefObject } from 'react';

/** Width of an element in whole pixels, followed as it changes; null until it was measured. */
export function useWidth<T extends HTMLElement>(): [RefObject<T | null>, number | null] {
  const element = useRef<T>(null);
  const [width, setWidth] = useState<number | null>(null);
  useEffect(() => {
    if (!element.current) return;
    const observer = new ResizeObserver(
      ([entry]) => entry && setWidth(Math.floor(entry.contentRect.width)),
    );
    observer.observe(element.current);
    return () => observer.disconnect();
  }, []);
  return [element, width];
}
