import { MAX_ENERGIES, type Observable, type ScanPoint } from '@/lib/inversion/index';
import { parseNumber, whyNotANumber } from './parse-number';
import { fileProblem, type FileProblem } from './problem';
import type { ScanColumns } from './scan-columns';
import type { Table, TableRow } from './table';

export { guessEnergyUnit, guessScanColumns, type ScanColumns } from './scan-columns';

export interface ScanReadOptions {
  observable: Observable;
  energyUnit: 'keV' | 'eV';
  /** Largest asymmetry A_max and its σ, when the values are amplitudes and not fractions. */
  asymmetry?: { maximum: number; sigma: number } | null;
  /** Lines that the person switched off: left out, without a problem. */
  skipLines?: readonly number[];
}

export type RowProblem = FileProblem & { line: number };
export type ScanRow = ScanPoint & { line: number; note: string | null; counts: number | null };

export interface ScanReading {
  points: ScanRow[];
  problems: RowProblem[];
  /** σ(A_max)/A_max: one scale error for all values, kept apart from their σ; null without `asymmetry`. */
  asymmetryScaleError: number | null;
}

/** How far outside its range a value may lie by noise alone, in σ (common practice, no source). */
const NOISE_SIGMAS = 5;
const SAME_ENERGY = 1e-9;
/** Enough to name every bad row of a scan that is somewhat too long, and a bound on the work for a file that is no scan. */
const MOST_ROWS_LOOKED_AT = 5 * MAX_ENERGIES;

/**
 * The points of an energy scan in the order of the file. Amplitudes become fractions F = A/A_max
 * with σ_F = σ_A/A_max. A row with a fault gives problems and no point; the scan may be stored only
 * when `problems` is empty.
 */
export function readScan(
  table: Table,
  columns: ScanColumns,
  options: ScanReadOptions,
): ScanReading {
  const reading: ScanReading = {
    points: [],
    problems: [],
    asymmetryScaleError: options.asymmetry
      ? options.asymmetry.sigma / options.asymmetry.maximum
      : null,
  };
  const skipped = new Set(options.skipLines ?? []);
  const rows = table.rows.filter((row) => !skipped.has(row.line));
  for (const row of rows.slice(0, MOST_ROWS_LOOKED_AT)) {
    const { point, problems } = readRow(table, row, columns, options);
    reading.problems.push(
      ...problems,
      ...(point ? clashes(table, point, columns, reading.points) : []),
    );
    if (point) reading.points.push(point);
  }
  reading.problems.push(...wholeScanProblems(table, rows, options));
  return reading;
}

interface RowReading {
  point: ScanRow | null;
  problems: RowProblem[];
}

function readRow(
  table: Table,
  row: TableRow,
  columns: ScanColumns,
  options: ScanReadOptions,
): RowReading {
  const problems: RowProblem[] = [];
  const complain = (column: number, sentence: string) =>
    problems.push(rowProblem(table.fileName, row.line, column, sentence));
  const read = (column: number, what: string) => {
    const cell = row.cells[column] ?? '';
    const value = parseNumber(cell, table.decimal);
    if (value === null) complain(column, whyNotANumber(cell, table.decimal, what));
    return value;
  };
  const energy = read(columns.energy, 'the energy');
  const value = read(columns.value, options.observable === 'rate' ? 'the rate' : 'the fraction');
  const sigma = read(columns.sigma, 'σ');
  const counts =
    columns.counts === null || (row.cells[columns.counts] ?? '') === ''
      ? null
      : read(columns.counts, 'the counts');
  if (energy !== null && energy <= 0) {
    complain(columns.energy, `expected an energy above 0 ${options.energyUnit}, found ${energy}.`);
  }
  if (sigma !== null && sigma <= 0) {
    complain(columns.sigma, `expected σ greater than 0, found ${sigma}.`);
  }
  if (counts !== null && counts < 0) {
    complain(columns.counts ?? 0, `expected counts of 0 or more, found ${counts}.`);
  }
  if (problems.length > 0 || energy === null || value === null || sigma === null) {
    return { point: null, problems };
  }
  const scale = options.asymmetry ? 1 / options.asymmetry.maximum : 1;
  const point: ScanRow = {
    energyKeV: options.energyUnit === 'eV' ? energy / 1000 : energy,
    value: value * scale,
    sigma: sigma * scale,
    enabled: true,
    line: row.line,
    note: columns.note === null ? null : row.cells[columns.note] || null,
    counts,
  };
  const outside = whyOutside(point, options);
  if (outside === null) return { point, problems };
  complain(columns.value, outside);
  return { point: null, problems };
}

/** A value that noise cannot have carried out of its range; null when it may stand. */
function whyOutside(
  { value, sigma }: ScanPoint,
  { observable, asymmetry }: ScanReadOptions,
): string | null {
  const below = value < -NOISE_SIGMAS * sigma;
  const above = observable === 'fraction' && value > 1 + NOISE_SIGMAS * sigma;
  if (!below && !above) return null;
  const found = `found ${short(value)} ± ${short(sigma)}`;
  if (observable === 'rate')
    return `expected a rate of 0 or more within ${NOISE_SIGMAS} σ, ${found}.`;
  const name = asymmetry ? 'amplitude over largest asymmetry' : 'fraction';
  return `expected a ${name} between 0 and 1 within ${NOISE_SIGMAS} σ, ${found}.`;
}

function clashes(
  { fileName }: Table,
  point: ScanRow,
  columns: ScanColumns,
  earlier: readonly ScanRow[],
): RowProblem[] {
  const same = earlier.find(
    ({ energyKeV }) => Math.abs(energyKeV - point.energyKeV) <= SAME_ENERGY * point.energyKeV,
  );
  if (!same) return [];
  const sentence = `expected each energy once, found ${short(point.energyKeV)} keV again; it already stands on line ${same.line}.`;
  return [rowProblem(fileName, point.line, columns.energy, sentence)];
}

function wholeScanProblems(
  { fileName, rows: allRows, headerLine }: Table,
  rows: readonly TableRow[],
  { asymmetry }: ScanReadOptions,
): RowProblem[] {
  const firstLine = allRows[0]?.line ?? headerLine ?? 1;
  const problems: RowProblem[] = [];
  if (asymmetry && !(asymmetry.maximum > 0 && asymmetry.sigma >= 0)) {
    const sentence = `expected a largest asymmetry above 0 with σ of 0 or more, found ${asymmetry.maximum} ± ${asymmetry.sigma}.`;
    problems.push(rowProblem(fileName, firstLine, null, sentence));
  }
  const tooMany = rows[MAX_ENERGIES];
  if (tooMany) {
    const sentence = `expected at most ${MAX_ENERGIES} energies, found ${rows.length} lines of data.`;
    problems.push(rowProblem(fileName, tooMany.line, null, sentence));
  }
  if (rows.length === 0) {
    const sentence = 'expected at least one line with energy, value and σ.';
    problems.push(rowProblem(fileName, firstLine, null, sentence));
  }
  return problems;
}

function rowProblem(
  fileName: string,
  line: number,
  column: number | null,
  sentence: string,
): RowProblem {
  const place = { fileName, line, column: column === null ? null : column + 1 };
  return { ...fileProblem(place, sentence), line };
}

function short(value: number): string {
  return String(Number(value.toPrecision(6)));
}
