import { readFileSync, statSync } from 'node:fs';
import { basename } from 'node:path';
import { sizeProblem } from '@/lib/files/decode-text';
import { readTable } from '@/lib/files/read-table';
import { guessEnergyUnit, guessScanColumns, readScan, type ScanRow } from '@/lib/files/scan-file';
import { guessStoppingLayout, readStoppingFiles } from '@/lib/files/stopping-file';
import type { Table } from '@/lib/files/table';
import {
  DEPTH_SCALE_PRIOR,
  type FitInput,
  type Response,
  type StoppingSet,
} from '@/lib/inversion/index';
import { BadInput } from './bad-input';
import type { InvertOptions } from './options';

export interface InvertInput {
  fit: FitInput;
  scanFileName: string;
  /** The points with their lines, so that a complaint about an energy can name the line. */
  rows: readonly ScanRow[];
  warnings: readonly string[];
}

/** The files and options as the input of a fit. Throws BadInput with every fault by file and line. */
export function readInput(options: InvertOptions): InvertInput {
  const rows = readScanFile(options);
  const { set, warnings } = readStopping(options);
  return {
    fit: {
      observable: options.observable,
      points: rows.map(({ energyKeV, value, sigma, enabled }) => ({
        energyKeV,
        value,
        sigma,
        enabled,
      })),
      stopping: set,
      profile: options.profile,
      polarity: options.polarity,
      response: responseOf(options),
      carriers: { bulkPerCm3: options.bulkPerCm3, bulkSigmaPerCm3: null, topPerCm3: null },
      capThicknessNm: options.capThicknessNm,
      parameters: options.depthScaleFree
        ? { depthScale: { held: false, value: null, prior: { ...DEPTH_SCALE_PRIOR } } }
        : {},
    },
    scanFileName: basename(options.scan),
    rows,
    warnings,
  };
}

function readScanFile({ scan, observable, energyUnit }: InvertOptions): ScanRow[] {
  const table = tableOf(scan);
  const columns = guessScanColumns(table);
  if (!columns) {
    const line = table.rows[0]?.line ?? 1;
    throw new BadInput([
      `${table.fileName}, line ${line}: expected three columns of numbers (energy, value, σ), found ${table.columnCount}.`,
    ]);
  }
  const unit = energyUnit ?? guessEnergyUnit(table, columns.energy);
  const { points, problems } = readScan(table, columns, { observable, energyUnit: unit });
  if (problems.length > 0) throw new BadInput(problems.map(({ message }) => message));
  return points;
}

function readStopping({ stopping, depthUnit }: InvertOptions): {
  set: StoppingSet;
  warnings: string[];
} {
  const tables = stopping.map(tableOf);
  const guess = guessStoppingLayout(tables);
  const { set, problems, warnings } = readStoppingFiles(tables, {
    depthUnit: depthUnit ?? guess.depthUnit,
    positionsAre: guess.positionsAre,
    weightsAre: guess.weightsAre,
    implantedPerEnergy: guess.implantedPerEnergy,
  });
  if (!set) throw new BadInput(problems.map(({ message }) => message));
  return { set, warnings };
}

function tableOf(path: string): Table {
  const fileName = basename(path);
  const read = readTable(fileName, bytesOf(path, fileName));
  if (!read.ok) throw new BadInput(read.problems.map(({ message }) => message));
  return read.table;
}

function bytesOf(path: string, fileName: string): Uint8Array {
  try {
    const tooLarge = sizeProblem(fileName, statSync(path).size);
    if (tooLarge) throw new BadInput([tooLarge.message]);
    return readFileSync(path);
  } catch (cause) {
    if (cause instanceof BadInput || !(cause instanceof Error)) throw cause;
    throw new BadInput([`${path}: the file cannot be read (${cause.message}).`]);
  }
}

function responseOf({ response, gammaCm3PerS, baselinePerUs }: InvertOptions): Response {
  if (response === 'two-level' || gammaCm3PerS === null) return { kind: 'two-level' };
  return { kind: 'capture-rate', gammaCm3PerS, gammaSigmaCm3PerS: null, baselinePerUs };
}
