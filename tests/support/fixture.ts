import { readFileSync } from 'node:fs';
import { basename, join } from 'node:path';
import { readTable, type ReadTableOptions } from '@/lib/files/read-table';
import type { Table } from '@/lib/files/table';

/** Where a file below fixtures/ lies, such as `files/scan.csv`. */
export function fixturePath(path: string): string {
  return join(import.meta.dirname, '../../fixtures', path);
}

export function fixtureBytes(path: string): Uint8Array {
  return readFileSync(fixturePath(path));
}

export function fixtureTable(path: string, options?: ReadTableOptions): Table {
  const read = readTable(basename(path), fixtureBytes(path), options);
  if (!read.ok) throw new Error(read.problems.map(({ message }) => message).join('\n'));
  return read.table;
}

export function tableOf(text: string, fileName = 'typed.csv', options?: ReadTableOptions): Table {
  const read = readTable(fileName, new TextEncoder().encode(text), options);
  if (!read.ok) throw new Error(read.problems.map(({ message }) => message).join('\n'));
  return read.table;
}
