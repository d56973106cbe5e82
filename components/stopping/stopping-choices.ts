import type { ChosenFile } from '@/components/upload/chosen-file';
import type { FileProblem } from '@/lib/files/problem';
import type { DepthUnit } from '@/lib/files/stopping-file';
import type { Decimal, Delimiter } from '@/lib/files/table';

/** What the person changed about one file; null leaves it as recognised. */
export interface FileChoices {
  delimiter: Delimiter | null;
  decimal: Decimal | null;
  /** Typed energy (keV) of a one-energy file; blank reads it from name or heading. */
  energy: string;
  skipLines: readonly number[];
}

/** A file with its choices. Names are unique: a file of the same name takes the place of the first. */
export interface StoppingEntry extends FileChoices {
  file: ChosenFile;
}

export interface StoppingChoices {
  entries: readonly StoppingEntry[];
  depthUnit: DepthUnit | null;
  positionsAre: 'centres' | 'edges' | null;
  weightsAre: 'counts' | 'density' | null;
  /** null takes what the files say; blank means that it is not known. */
  implanted: string | null;
}

export const NO_STOPPING_CHOICES: StoppingChoices = {
  entries: [],
  depthUnit: null,
  positionsAre: null,
  weightsAre: null,
  implanted: null,
};

export function withFiles(choices: StoppingChoices, files: readonly ChosenFile[]): StoppingChoices {
  const added = files.map((file) => ({
    file,
    delimiter: null,
    decimal: null,
    energy: '',
    skipLines: [],
  }));
  const names = new Set(files.map(({ name }) => name));
  const kept = choices.entries.filter(({ file }) => !names.has(file.name));
  return { ...choices, entries: [...kept, ...added] };
}

export function withoutFile(choices: StoppingChoices, name: string): StoppingChoices {
  const entries = choices.entries.filter(({ file }) => file.name !== name);
  return entries.length === 0 ? NO_STOPPING_CHOICES : { ...choices, entries };
}

export function withFileChoices(
  choices: StoppingChoices,
  name: string,
  change: Partial<FileChoices>,
): StoppingChoices {
  const entries = choices.entries.map((entry) =>
    entry.file.name === name ? { ...entry, ...change } : entry,
  );
  return { ...choices, entries };
}

/** Leaves out the lines that these problems name. */
export function withLinesLeftOut(
  choices: StoppingChoices,
  problems: readonly FileProblem[],
): StoppingChoices {
  const linesOf = new Map<string, Set<number>>();
  for (const { fileName, line } of problems) {
    if (line === null) continue;
    linesOf.set(fileName, (linesOf.get(fileName) ?? new Set()).add(line));
  }
  const entries = choices.entries.map((entry) => {
    const lines = linesOf.get(entry.file.name);
    return lines ? { ...entry, skipLines: [...new Set([...entry.skipLines, ...lines])] } : entry;
  });
  return { ...choices, entries };
}
