import type { SheetError } from '@/components/sheet/sheet-errors';
import { isBlankRow, type SheetLine, type SheetRow } from '@/components/sheet/sheet-rows';
import { parseNumber } from '@/lib/files/parse-number';
import type { Scan, TypedPoint } from '@/lib/schemas/scan';

export const ENERGY = 0;
export const VALUE = 1;
export const SIGMA = 2;
export const NOTE = 3;

/** How far outside [0, 1] noise may carry a fraction, in σ (common practice, no source); as for files. */
const NOISE_SIGMAS = 5;
const MAX_ENERGY_KEV = 1000;
const MAX_NOTE = 200;

export interface TypedReading {
  points: TypedPoint[];
  errors: SheetError[];
}

/** The points of a grid of energy (keV), value, σ and note; blank rows count for nothing. */
export function readTypedPoints(
  rows: readonly SheetRow[],
  observable: Scan['observable'],
): TypedReading {
  const reading: TypedReading = { points: [], errors: [] };
  const rowOfEnergy = new Map<number, number>();
  rows.forEach((row, index) => {
    if (isBlankRow(row)) return;
    const { point, faults } = readRow(row, observable);
    if (point) {
      const first = rowOfEnergy.get(point.energyKeV);
      if (first === undefined) rowOfEnergy.set(point.energyKeV, index);
      else
        faults.push([
          ENERGY,
          `${point.energyKeV} keV stands in row ${first + 1} already; expected each energy once.`,
        ]);
    }
    if (point && faults.length === 0) reading.points.push(point);
    for (const [column, sentence] of faults) {
      reading.errors.push({
        rowId: row.id,
        column,
        message: `Row ${index + 1}, ${columnName(column, observable)}: ${sentence}`,
      });
    }
  });
  return reading;
}

/** The name of a column as the head of the grid says it. */
export function columnName(column: number, observable: Scan['observable']): string {
  return ['energy', observable, 'σ', 'note'][column] ?? '';
}

type Fault = [column: number, sentence: string];

function readRow(
  row: SheetRow,
  observable: Scan['observable'],
): { point: TypedPoint | null; faults: Fault[] } {
  const faults: Fault[] = [];
  const numberAt = (column: number): number | null => {
    const cell = row.cells[column] ?? '';
    const value = parseNumber(cell, 'point') ?? parseNumber(cell, 'comma');
    if (value === null) {
      faults.push([
        column,
        `expected a number, found ${cell.trim() === '' ? 'an empty cell' : `“${cell.trim()}”`}.`,
      ]);
    }
    return value;
  };
  const energyKeV = numberAt(ENERGY);
  const value = numberAt(VALUE);
  const sigma = numberAt(SIGMA);
  const note = (row.cells[NOTE] ?? '').trim();
  if (energyKeV !== null && !(energyKeV > 0 && energyKeV <= MAX_ENERGY_KEV)) {
    faults.push([
      ENERGY,
      `expected keV above 0 and at most ${MAX_ENERGY_KEV}, found ${energyKeV}.`,
    ]);
  }
  if (sigma !== null && sigma <= 0)
    faults.push([SIGMA, `expected a number above 0, found ${sigma}.`]);
  if (note.length > MAX_NOTE) faults.push([NOTE, `at most ${MAX_NOTE} characters.`]);
  if (value !== null && sigma !== null && sigma > 0) {
    const outside = outsideRange(value, sigma, observable);
    if (outside !== null) faults.push([VALUE, outside]);
  }
  if (energyKeV === null || value === null || sigma === null || faults.length > 0)
    return { point: null, faults };
  return { point: { energyKeV, value, sigma, enabled: row.on, note }, faults };
}

function outsideRange(value: number, sigma: number, observable: Scan['observable']): string | null {
  const slack = NOISE_SIGMAS * sigma;
  if (observable === 'fraction' && (value < -slack || value > 1 + slack)) {
    return `expected a fraction from 0 to 1 (within ${NOISE_SIGMAS} σ), found ${value}.`;
  }
  if (observable === 'rate' && value < -slack)
    return `expected a rate of 0 or more (within ${NOISE_SIGMAS} σ), found ${value}.`;
  return null;
}

/** Grid lines of stored points: they can be switched off and never removed. */
export function linesOfPoints(points: readonly TypedPoint[]): SheetLine[] {
  return points.map((point) => ({
    cells: [String(point.energyKeV), String(point.value), String(point.sigma), point.note],
    on: point.enabled,
    kept: true,
  }));
}

/** Why a grid cannot be stored yet; null when it can. */
export function whyTypedBlocked({ points, errors }: TypedReading): string | null {
  if (errors.length > 0)
    return errors.length === 1 ? 'One cell needs mending.' : `${errors.length} cells need mending.`;
  return points.length === 0 ? 'Type or paste at least one point.' : null;
}
