import type { StoppingSet } from '@/lib/inversion/index';

const MOST_WORKERS = 8;
/** Each worker holds its own copy of the stopping set; together they may hold this much. */
const MOST_BYTES = 256 * 1024 * 1024;

/** Workers for a machine: one per core, at least one, at most eight. */
export function poolSize(cores: number | undefined): number {
  return Math.max(1, Math.min(MOST_WORKERS, Math.floor(cores || 1)));
}

/** How many of them may resample with this stopping set without filling the memory. */
export function workersFor(size: number, stopping: StoppingSet): number {
  const bytes = stopping.profiles.reduce(
    (sum, { mass, edgesNm }) => sum + mass.byteLength + edgesNm.byteLength,
    0,
  );
  return Math.max(1, Math.min(size, Math.floor(MOST_BYTES / Math.max(1, bytes))));
}
