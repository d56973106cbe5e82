'use client';

import { useMemo } from 'react';
import useSWR from 'swr';

import type { StoppingSet } from '@/lib/inversion/index';
import type { Scan } from '@/lib/schemas/scan';
import type { StoppingSetAnswer } from '@/lib/schemas/stopping-set';

import { fetchJson } from './fetch-json';
import { stoppingSetOf } from './fit-input';

/** Stored inputs do not change while a person works on them; a new visit asks again. */
const QUIET = { revalidateOnFocus: false, revalidateOnReconnect: false };

export function useScan(start: Scan): Scan {
  const { data } = useSWR<Scan, Error>(`/api/scans/${start.id}`, fetchJson, {
    ...QUIET,
    fallbackData: start,
    revalidateOnMount: false,
  });
  return data ?? start;
}

export interface LoadedSet {
  answer: StoppingSetAnswer | null;
  set: StoppingSet | null;
  error: string | null;
  loading: boolean;
}

/** The stopping set with its profiles; none while no set is chosen. */
export function useStoppingSet(id: string | null): LoadedSet {
  const { data, error, isLoading } = useSWR<StoppingSetAnswer, Error>(
    id === null ? null : `/api/stopping-sets/${id}`,
    fetchJson,
    QUIET,
  );
  const set = useMemo(() => (data ? stoppingSetOf(data) : null), [data]);
  return { answer: data ?? null, set, error: error?.message ?? null, loading: isLoading };
}
