'use client';

import { useEffect, useEffectEvent } from 'react';

import { deskKey, type DeskKey } from './desk-keys';

/** Enter fits, Ctrl+Z takes back, Ctrl+Y brings again, wherever the focus is on the page. */
export function useDeskKeys(act: (key: DeskKey) => void): void {
  const press = useEffectEvent((event: KeyboardEvent) => {
    const key = event.defaultPrevented ? null : deskKey(event);
    if (key === null) return;
    event.preventDefault();
    act(key);
  });
  useEffect(() => {
    const listen = (event: KeyboardEvent) => press(event);
    window.addEventListener('keydown', listen);
    return () => window.removeEventListener('keydown', listen);
  }, []);
}
