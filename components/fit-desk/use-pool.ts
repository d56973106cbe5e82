'use client';

import { useCallback, useEffect, useRef } from 'react';

import { startInversionPool } from '@/workers/client';
import type { InversionPool } from '@/workers/pool';

/** The pool of this page: started when first asked for, ended with the page. */
export function usePool(): () => InversionPool {
  const pool = useRef<InversionPool | null>(null);
  useEffect(
    () => () => {
      pool.current?.end();
      pool.current = null;
    },
    [],
  );
  return useCallback(() => (pool.current ??= startInversionPool()), []);
}
