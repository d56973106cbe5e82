import { typedNumber } from '@/components/upload/typed-number';
import {
  guessEnergyUnit,
  readScan,
  type ScanColumns,
  type ScanReading,
} from '@/lib/files/scan-file';
import type { Decimal, Delimiter, Table } from '@/lib/files/table';
import type { Scan, ScanReading as ScanReadingSent } from '@/lib/schemas/scan';

export type ColumnRole = keyof ScanColumns;
const COLUMN_ROLES = [
  'energy',
  'value',
  'sigma',
  'note',
  'counts',
] as const satisfies readonly ColumnRole[];

/** What the person changed about how a file is read; null or absent leaves it as recognised. */
export interface ScanChoices {
  delimiter: Delimiter | null;
  decimal: Decimal | null;
  columns: Partial<Record<ColumnRole, number | null>>;
  energyUnit: 'keV' | 'eV' | null;
  /** The values are asymmetry amplitudes, to be divided by the maximum asymmetry. */
  amplitudes: { on: boolean; maximum: string; sigma: string };
  skipLines: readonly number[];
}

export const NO_CHOICES: ScanChoices = {
  delimiter: null,
  decimal: null,
  columns: {},
  energyUnit: null,
  amplitudes: { on: false, maximum: '', sigma: '' },
  skipLines: [],
};

export type ColumnMatch = Record<ColumnRole, number | null>;

export interface ScanPreview {
  match: ColumnMatch;
  energyUnit: 'keV' | 'eV';
  /** null while columns or the maximum asymmetry are not settled. */
  reading: ScanReading | null;
  /** Why the rows cannot be stored as they are; null when they can. */
  blocked: string | null;
  /** What is sent along with the file; null while blocked. */
  sent: ScanReadingSent | null;
}

const ROLE_WORDS: Record<ColumnRole, string> = {
  energy: 'energy',
  value: 'value',
  sigma: 'σ',
  note: 'note',
  counts: 'counts',
};

/**
 * Reads a table the way the person chose, and says what stands in the way of storing it. `guess` is
 * what was recognised of its columns.
 */
export function previewScan(
  table: Table,
  guess: ScanColumns | null,
  choices: ScanChoices,
  observable: Scan['observable'],
): ScanPreview {
  const match = matchColumns(guess, choices);
  const energyUnit =
    choices.energyUnit ?? (match.energy === null ? 'keV' : guessEnergyUnit(table, match.energy));
  const base = { match, energyUnit };
  const columns = settledColumns(match);
  if (typeof columns === 'string') return { ...base, reading: null, blocked: columns, sent: null };
  const asymmetry = observable === 'fraction' ? readAmplitudes(choices.amplitudes) : null;
  if (typeof asymmetry === 'string')
    return { ...base, reading: null, blocked: asymmetry, sent: null };

  const skipLines = [...choices.skipLines];
  const reading = readScan(table, columns, { observable, energyUnit, asymmetry, skipLines });
  const blocked = whyBlocked(reading);
  const { delimiter, decimal } = table;
  const sent =
    blocked === null ? { delimiter, decimal, columns, energyUnit, asymmetry, skipLines } : null;
  return { ...base, reading, blocked, sent };
}

function matchColumns(guess: ScanColumns | null, choices: ScanChoices): ColumnMatch {
  const pick = (role: ColumnRole) => {
    const chosen = choices.columns[role];
    return chosen === undefined ? (guess?.[role] ?? null) : chosen;
  };
  return {
    energy: pick('energy'),
    value: pick('value'),
    sigma: pick('sigma'),
    note: pick('note'),
    counts: pick('counts'),
  };
}

/** The columns when they can be used, otherwise the reason why not. */
function settledColumns(match: ColumnMatch): ScanColumns | string {
  const { energy, value, sigma, note, counts } = match;
  if (energy === null || value === null || sigma === null) {
    const missing = COLUMN_ROLES.slice(0, 3).filter((role) => match[role] === null);
    return `Choose the column of ${missing.map((role) => ROLE_WORDS[role]).join(' and ')}.`;
  }
  const used = COLUMN_ROLES.filter((role) => match[role] !== null);
  const twin = used.find((role, index) =>
    used.slice(0, index).some((other) => match[other] === match[role]),
  );
  if (twin)
    return `Column ${(match[twin] ?? 0) + 1} is chosen twice; ${ROLE_WORDS[twin]} needs a column of its own.`;
  return { energy, value, sigma, note, counts };
}

/** Maximum asymmetry and σ as typed; null when the values are no amplitudes; a sentence when it is not settled. */
function readAmplitudes({
  on,
  maximum,
  sigma,
}: ScanChoices['amplitudes']): { maximum: number; sigma: number } | string | null {
  if (!on) return null;
  const limit = typedNumber(maximum) ?? Number.NaN;
  if (!(limit > 0 && limit <= 1))
    return 'Write the maximum asymmetry: a number above 0 and at most 1.';
  const spread = typedNumber(sigma) ?? Number.NaN;
  if (!(spread >= 0 && spread <= 1))
    return 'Write σ of the maximum asymmetry: a number from 0 to 1.';
  return { maximum: limit, sigma: spread };
}

function whyBlocked({ problems, points }: ScanReading): string | null {
  if (problems.length > 0) {
    const lines = new Set(problems.map(({ line }) => line)).size;
    return lines === 1
      ? 'One line needs mending or leaving out.'
      : `${lines} lines need mending or leaving out.`;
  }
  return points.length === 0 ? 'No points are left.' : null;
}
