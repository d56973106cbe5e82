import { byteWords } from '@/components/upload/byte-words';
import type { ChosenFile } from '@/components/upload/chosen-file';
import { typedNumber } from '@/components/upload/typed-number';
import type { FileProblem } from '@/lib/files/problem';
import { profileEnergies } from '@/lib/files/profile-energies';
import { readTable, type ReadTableResult } from '@/lib/files/read-table';
import {
  guessStoppingLayout,
  readStoppingFiles,
  type StoppingReading,
  type StoppingLayout,
} from '@/lib/files/stopping-file';
import type { Table } from '@/lib/files/table';
import type { StoppingReading as StoppingReadingSent } from '@/lib/schemas/stopping-set';

import type { StoppingChoices, StoppingEntry } from './stopping-choices';

export interface FilePreview {
  entry: StoppingEntry;
  table: Table | null;
  /** Energies of its profiles, keV; null where neither file nor person names one. */
  energiesKeV: readonly (number | null)[];
}

export type Layout = Omit<StoppingLayout, 'energiesKeV'>;

export interface StoppingPreview extends StoppingReading {
  files: readonly FilePreview[];
  layout: Layout;
  /** Why the set cannot be stored yet; null when it can. */
  blocked: string | null;
  /** What is sent along with the files; null while blocked. */
  sent: StoppingReadingSent | null;
}

/** A text is taken apart once per format; changing a unit does not read it again. */
export type TableCache = WeakMap<ChosenFile, { format: string; result: ReadTableResult }>;

/** Reads all files the way the person chose, and says what stands in the way of storing them. */
export function previewStopping(choices: StoppingChoices, cache: TableCache): StoppingPreview {
  const { entries } = choices;
  const results = entries.map((entry) => readCached(entry, cache));
  const tables = results.flatMap((result) => (result.ok ? [result.table] : []));
  const refused = results.flatMap((result) => (result.ok ? [] : result.problems));
  const layout = settleLayout(choices, tables);
  const files = entries.map((entry, index) => filePreview(entry, results[index]));
  const inputFault = whyTooMuch(entries) ?? whyTypedWrong(choices);
  const mayRead = tables.length > 0 && refused.length === 0 && inputFault === null;
  const reading = mayRead
    ? readAll(tables, files, layout)
    : { set: null, problems: [], warnings: [] };
  const problems = [...refused, ...reading.problems];
  const blocked = whyBlocked(problems, inputFault, reading.set === null);
  const sent = blocked === null ? toSend(files, layout) : null;
  return { ...reading, problems, files, layout, blocked, sent };
}

/** The table of one file, read at most once per format. */
export function readCached(
  { file, delimiter, decimal }: StoppingEntry,
  cache: TableCache,
): ReadTableResult {
  const format = `${delimiter} ${decimal}`;
  const known = cache.get(file);
  if (known?.format === format) return known.result;
  const result = readTable(file.name, file.bytes, {
    delimiter: delimiter ?? undefined,
    decimal: decimal ?? undefined,
  });
  cache.set(file, { format, result });
  return result;
}

function settleLayout(choices: StoppingChoices, tables: readonly Table[]): Layout {
  const guess = guessStoppingLayout(tables);
  return {
    layout: guess.layout,
    depthUnit: choices.depthUnit ?? guess.depthUnit,
    positionsAre: choices.positionsAre ?? guess.positionsAre,
    weightsAre: choices.weightsAre ?? guess.weightsAre,
    implantedPerEnergy:
      choices.implanted === null ? guess.implantedPerEnergy : typedNumber(choices.implanted),
  };
}

function filePreview(entry: StoppingEntry, result: ReadTableResult | undefined): FilePreview {
  if (!result?.ok) return { entry, table: null, energiesKeV: [] };
  const { table } = result;
  return { entry, table, energiesKeV: profileEnergies([table], [typedNumber(entry.energy)]) };
}

function readAll(
  tables: readonly Table[],
  files: readonly FilePreview[],
  layout: Layout,
): StoppingReading {
  const skipLines = Object.fromEntries(
    files.map(({ entry }) => [entry.file.name, [...entry.skipLines]]),
  );
  const energiesKeV = files.flatMap((file) => file.energiesKeV);
  return readStoppingFiles(tables, { ...layout, energiesKeV, skipLines });
}

/** What the server takes in one upload; said here before anything is sent. */
const MOST_FILES = 200;
const MOST_BYTES = 20 * 1024 * 1024;

function whyTooMuch(entries: readonly StoppingEntry[]): string | null {
  if (entries.length > MOST_FILES)
    return `Expected at most ${MOST_FILES} files, found ${entries.length}.`;
  const total = entries.reduce((sum, { file }) => sum + file.bytes.byteLength, 0);
  return total > MOST_BYTES
    ? `The files have ${byteWords(total)} together; expected at most ${byteWords(MOST_BYTES)}.`
    : null;
}

/** A typed number that is none would silently be read as "not given"; it is said instead. */
function whyTypedWrong({ entries, implanted }: StoppingChoices): string | null {
  const bad = entries.find(({ energy }) => !isAboveZeroOrBlank(energy));
  if (bad) return `Energy of ${bad.file.name}: expected keV above 0.`;
  return isAboveZeroOrBlank(implanted ?? '')
    ? null
    : 'Implanted muons: expected a number above 0, or nothing.';
}

function isAboveZeroOrBlank(text: string): boolean {
  const value = typedNumber(text);
  return value === null || value > 0;
}

function whyBlocked(
  problems: readonly FileProblem[],
  inputFault: string | null,
  noSet: boolean,
): string | null {
  if (inputFault !== null) return inputFault;
  if (problems.length === 1) return 'One problem needs mending.';
  if (problems.length > 1) return `${problems.length.toLocaleString('en')} problems need mending.`;
  return noSet ? 'Choose the files first.' : null;
}

function toSend(files: readonly FilePreview[], layout: Layout): StoppingReadingSent {
  const { depthUnit, positionsAre, weightsAre, implantedPerEnergy } = layout;
  return {
    depthUnit,
    positionsAre,
    weightsAre,
    implantedPerEnergy,
    files: files.flatMap(({ entry, table, energiesKeV }) =>
      table === null
        ? []
        : [
            {
              delimiter: table.delimiter,
              decimal: table.decimal,
              energyKeV: energiesKeV.length === 1 ? typedNumber(entry.energy) : null,
              skipLines: [...entry.skipLines],
            },
          ],
    ),
  };
}
