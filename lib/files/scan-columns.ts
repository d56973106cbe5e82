import { HEADING } from './heading-words';
import { parseNumber } from './parse-number';
import type { Table } from './table';

/** Which column (0-based) holds what. */
export interface ScanColumns {
  energy: number;
  value: number;
  sigma: number;
  note: number | null;
  counts: number | null;
}

/** A value so large can only be eV: no low-energy beam reaches 200 keV. */
const LARGEST_KEV = 200;
/** Whole numbers from here on are taken for events, not for a run number in a note. */
const SMALLEST_COUNT = 10_000;

/**
 * A first guess at the columns of a scan, by the words of the header where there is one, otherwise
 * the first three columns of numbers in the order energy, value, σ. Null with fewer than three columns.
 */
export function guessScanColumns(table: Table): ScanColumns | null {
  if (table.columnCount < 3) return null;
  const taken = new Set<number>();
  const claim = (column: number | null) => {
    if (column !== null) taken.add(column);
    return column;
  };
  const byWord = (pattern: RegExp) => claim(findHeading(table, pattern, taken));
  // σ before the value ("error of the fraction"), both before the energy ("fraction at energy").
  const sigma = byWord(HEADING.sigma);
  const counts = byWord(HEADING.counts);
  const note = byWord(HEADING.note);
  const value = byWord(HEADING.value);
  const energy = byWord(HEADING.energy);
  const nextNumbers = () => claim(findNumbers(table, taken));
  const guess = {
    energy: energy ?? nextNumbers(),
    value: value ?? nextNumbers(),
    sigma: sigma ?? nextNumbers(),
  };
  if (guess.energy === null || guess.value === null || guess.sigma === null) return null;
  const columns = { energy: guess.energy, value: guess.value, sigma: guess.sigma };
  return {
    ...columns,
    counts: counts ?? findCounts(table, taken),
    note: note ?? findWords(table, taken),
  };
}

/** eV when the heading says so, or when the numbers are too large for keV. */
export function guessEnergyUnit(table: Table, energyColumn: number): 'keV' | 'eV' {
  const heading = table.header?.[energyColumn]?.toLowerCase() ?? '';
  if (/kev/.test(heading)) return 'keV';
  if (/(?:^|[^a-z])ev(?:[^a-z]|$)/.test(heading)) return 'eV';
  return numbersIn(table, energyColumn).some((value) => value > LARGEST_KEV) ? 'eV' : 'keV';
}

function findHeading(table: Table, pattern: RegExp, taken: ReadonlySet<number>): number | null {
  const column = (table.header ?? []).findIndex(
    (cell, index) => !taken.has(index) && pattern.test(cell.trim().toLowerCase()),
  );
  return column < 0 ? null : column;
}

function columnsLeft(table: Table, taken: ReadonlySet<number>): number[] {
  return Array.from({ length: table.columnCount }, (_, index) => index).filter(
    (index) => !taken.has(index),
  );
}

function numbersIn(table: Table, column: number): number[] {
  return table.rows
    .map((row) => parseNumber(row.cells[column] ?? '', table.decimal))
    .filter((value) => value !== null);
}

/** The next column that is mostly numbers: one bad cell must not push a column aside. */
function findNumbers(table: Table, taken: ReadonlySet<number>): number | null {
  const enough = table.rows.length / 2;
  return (
    columnsLeft(table, taken).find((column) => numbersIn(table, column).length > enough) ?? null
  );
}

function findCounts(table: Table, taken: Set<number>): number | null {
  const isCount = (value: number) => Number.isInteger(value) && value >= SMALLEST_COUNT;
  const column = columnsLeft(table, taken).find((index) => {
    const values = numbersIn(table, index);
    return values.length > 0 && values.every(isCount);
  });
  if (column === undefined) return null;
  taken.add(column);
  return column;
}

function findWords(table: Table, taken: ReadonlySet<number>): number | null {
  const holdsText = (column: number) => table.rows.some((row) => (row.cells[column] ?? '') !== '');
  return columnsLeft(table, taken).find(holdsText) ?? null;
}
