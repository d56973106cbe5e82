import { fileRefusal } from '@/db/access/file-refusal';
import { AppError } from '@/lib/errors';
import { fileProblem, type FileProblem } from '@/lib/files/problem';
import { profileEnergies } from '@/lib/files/profile-energies';
import { readTable } from '@/lib/files/read-table';
import { readStoppingFiles } from '@/lib/files/stopping-file';
import type { Table } from '@/lib/files/table';
import type { StoppingSet } from '@/lib/inversion/index';
import type { createStoppingSetSchema } from '@/lib/schemas/stopping-set';
import { setImmediate as nextTurn } from 'node:timers/promises';
import type { z } from 'zod';

type Upload = Pick<z.output<typeof createStoppingSetSchema>, 'reading' | 'files'>;

/** The profiles in the uploaded files, read again from their bytes, or a refusal that names every fault. */
export async function readUploadedSet({
  reading,
  files,
}: Upload): Promise<{ set: StoppingSet; warnings: string[] }> {
  if (reading.files.length !== files.length)
    throw new AppError('invalid', `Expected ${reading.files.length} files, found ${files.length}.`);
  const problems: FileProblem[] = twinNames(files.map(({ name }) => name));
  const tables: Table[] = [];
  for (const [index, { name, bytes }] of files.entries()) {
    const { delimiter, decimal } = reading.files[index] ?? {};
    const read = readTable(name, bytes, { delimiter, decimal });
    if (read.ok) tables.push(read.table);
    else problems.push(...read.problems);
    // Twenty megabytes take a while to read: others get their turn between files.
    await nextTurn();
  }
  if (problems.length > 0) throw fileRefusal(problems);

  const found = readStoppingFiles(tables, {
    depthUnit: reading.depthUnit,
    positionsAre: reading.positionsAre,
    weightsAre: reading.weightsAre,
    implantedPerEnergy: reading.implantedPerEnergy,
    energiesKeV: profileEnergies(
      tables,
      reading.files.map(({ energyKeV }) => energyKeV),
    ),
    skipLines: Object.fromEntries(
      files.map(({ name }, index) => [name, reading.files[index]?.skipLines ?? []]),
    ),
  });
  if (found.set === null || found.problems.length > 0) throw fileRefusal(found.problems);
  return { set: found.set, warnings: found.warnings };
}

/** Faults and switched-off lines are told by file name, so no two may be called the same. */
function twinNames(names: readonly string[]): FileProblem[] {
  return names
    .filter((name, index) => names.indexOf(name) !== index)
    .map((fileName) => fileProblem({ fileName }, 'expected each file name once, found it again.'));
}
