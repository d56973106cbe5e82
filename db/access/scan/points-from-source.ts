import { fileRefusal } from '@/db/access/file-refusal';
import { AppError } from '@/lib/errors';
import { readTable } from '@/lib/files/read-table';
import { readScan } from '@/lib/files/scan-file';
import type { createScanSchema, ScanReading, TypedPoint } from '@/lib/schemas/scan';
import type { z } from 'zod';

import { checkPoints } from './check-points';

type CreateScan = z.output<typeof createScanSchema>;

export interface ScanContent {
  points: TypedPoint[];
  asymmetryScaleError: number | null;
  reading: ScanReading | null;
}

/**
 * The points of a new scan. A file is read again here from its bytes: what the browser showed is a
 * preview, and nothing of it is taken over.
 */
export function pointsFromSource({ meta, source }: CreateScan): ScanContent {
  if (source.kind === 'typed') {
    checkPoints(source.points, meta.observable);
    return { points: source.points, asymmetryScaleError: null, reading: null };
  }
  const { delimiter, decimal, columns, energyUnit, asymmetry, skipLines } = source.reading;
  if (asymmetry !== null && meta.observable !== 'fraction')
    throw new AppError('invalid', 'Amplitudes turn into fractions, never into rates.');
  const table = readTable(source.name, source.bytes, { delimiter, decimal });
  if (!table.ok) throw fileRefusal(table.problems);
  const options = { observable: meta.observable, energyUnit, asymmetry, skipLines };
  const scan = readScan(table.table, columns, options);
  if (scan.problems.length > 0) throw fileRefusal(scan.problems);
  const points = scan.points.map(({ energyKeV, value, sigma, enabled, note }) => ({
    energyKeV,
    value,
    sigma,
    enabled,
    note: (note ?? '').slice(0, 200),
  }));
  return { points, asymmetryScaleError: scan.asymmetryScaleError, reading: source.reading };
}
