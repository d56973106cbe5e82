import { MAX_BINS } from '@/lib/inversion/index';
import type { DepthUnit, StoppingColumn } from './guess-stopping-layout';
import { parseNumber, whyNotANumber } from './parse-number';
import { fileProblem, type FileProblem } from './problem';
import type { StoppingReadOptions } from './stopping-options';
import type { Table, TableRow } from './table';

/** Nobody mends more by hand; a file with so many faults is another kind of file. */
const MOST_PROBLEMS = 1000;
const NM_PER: Record<DepthUnit, number> = { nm: 1, A: 0.1, um: 1000 };

export interface StoppingRows {
  /** Centres, or edges (one more than the weights). */
  positionsNm: number[];
  /** One list per column asked for. */
  weights: number[][];
  problems: FileProblem[];
  warnings: string[];
}

/** The numbers of one stopping table, with every fault by line and column. */
export function readStoppingRows(
  table: Table,
  columns: readonly StoppingColumn[],
  options: StoppingReadOptions,
): StoppingRows {
  const skipped = new Set(options.skipLines?.[table.fileName] ?? []);
  const rows = table.rows.filter((row) => !skipped.has(row.line));
  const edges = options.positionsAre === 'edges';
  const closing = edges ? closingRow(rows) : null;
  const result: StoppingRows = {
    positionsNm: [],
    weights: columns.map(() => []),
    problems: [],
    warnings: [],
  };
  for (const row of rows) {
    if (result.problems.length >= MOST_PROBLEMS) {
      const sentence = `more than ${MOST_PROBLEMS} faults; the rest of the file was not looked at.`;
      result.problems.push(fileProblem({ fileName: table.fileName, line: row.line }, sentence));
      break;
    }
    readDepth(table, row, options.depthUnit, result);
    if (row === closing) continue;
    columns.forEach(({ column }, index) => readWeight(table, row, column, result, index));
  }
  if (result.problems.length > 0) return result;
  if (edges && closing === null) closeLastBin(table, result);
  checkAmount(table, rows, result);
  checkColumns(table, columns, result);
  return result;
}

/** The last line, when it gives a position and no counts. */
function closingRow(rows: readonly TableRow[]): TableRow | null {
  const last = rows.at(-1);
  return last && last.cells.slice(1).every((cell) => cell === '') ? last : null;
}

function readDepth(table: Table, row: TableRow, unit: DepthUnit, result: StoppingRows): void {
  const cell = row.cells[0] ?? '';
  const complain = (sentence: string) =>
    result.problems.push(
      fileProblem({ fileName: table.fileName, line: row.line, column: 1 }, sentence),
    );
  const value = parseNumber(cell, table.decimal);
  if (value === null) {
    complain(whyNotANumber(cell, table.decimal, 'the depth'));
    return;
  }
  const depthNm = value * NM_PER[unit];
  const before = result.positionsNm.at(-1);
  if (depthNm < 0) complain(`expected a depth of 0 or more, found ${cell}.`);
  else if (before !== undefined && depthNm <= before) {
    complain(
      `expected depths in ascending order, found ${cell} after ${short(before / NM_PER[unit])}.`,
    );
  }
  // Kept even when out of order, so that one misplaced line is not reported again by all that follow.
  result.positionsNm.push(depthNm);
}

function readWeight(
  table: Table,
  row: TableRow,
  column: number,
  result: StoppingRows,
  index: number,
): void {
  const cell = row.cells[column] ?? '';
  const place = { fileName: table.fileName, line: row.line, column: column + 1 };
  const value = parseNumber(cell, table.decimal);
  if (value === null) {
    result.problems.push(fileProblem(place, whyNotANumber(cell, table.decimal, 'the counts')));
  } else if (value < 0) {
    result.problems.push(fileProblem(place, `expected counts of 0 or more, found ${cell}.`));
  } else {
    result.weights[index]?.push(value);
  }
}

function closeLastBin({ fileName }: Table, { positionsNm, warnings }: StoppingRows): void {
  const last = positionsNm.at(-1) ?? 0;
  const before = positionsNm.at(-2) ?? 0;
  positionsNm.push(2 * last - before);
  warnings.push(
    `${fileName}: no line closes the last bin; it is taken to be as wide as the one before it (${short(last - before)} nm).`,
  );
}

function checkAmount(
  { fileName, headerLine }: Table,
  rows: readonly TableRow[],
  { weights, problems }: StoppingRows,
): void {
  const bins = weights[0]?.length ?? 0;
  if (bins > MAX_BINS) {
    const line = rows[MAX_BINS]?.line ?? null;
    problems.push(
      fileProblem({ fileName, line }, `expected at most ${MAX_BINS} depth bins, found ${bins}.`),
    );
  } else if (bins < 2) {
    const line = rows[0]?.line ?? headerLine;
    problems.push(
      fileProblem({ fileName, line }, `expected at least two depth bins, found ${bins}.`),
    );
  }
}

/** More than this share of the stops in the last bin means that the depths end too early (common practice, no source). */
const LAST_BIN_SHARE = 0.005;

function checkColumns(
  table: Table,
  columns: readonly StoppingColumn[],
  result: StoppingRows,
): void {
  columns.forEach(({ column, energyKeV }, index) => {
    const weights = result.weights[index] ?? [];
    const total = weights.reduce((sum, weight) => sum + weight, 0);
    if (total === 0) {
      const place = {
        fileName: table.fileName,
        line: table.rows[0]?.line ?? null,
        column: column + 1,
      };
      result.problems.push(
        fileProblem(place, `expected some counts at ${energyKeV} keV, found zero on every line.`),
      );
    } else if ((weights.at(-1) ?? 0) > LAST_BIN_SHARE * total) {
      result.warnings.push(
        `${table.fileName}: at ${energyKeV} keV muons still stop in the last bin; the depths may end too early.`,
      );
    }
  });
}

function short(value: number): string {
  return String(Number(value.toPrecision(6)));
}
