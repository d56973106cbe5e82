import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import { join, relative } from 'node:path';
import { describe, expect, it } from 'vitest';
import { fixtureFiles } from '@/fixtures/generator/fixture-files';
import { fixtureBytes, fixturePath } from '../support/fixture';

function checksumsInReadme(): Map<string, string> {
  const readme = readFileSync(fixturePath('README.md'), 'utf8');
  const rows = readme.matchAll(/^\| (\S+) \| ([0-9a-f]{64}) \|$/gm);
  return new Map(Array.from(rows, ([, path = '', sum = '']) => [path, sum]));
}

function filesOnDisk(): string[] {
  return ['files', 'bad'].flatMap((folder) =>
    readdirSync(fixturePath(folder), { recursive: true, withFileTypes: true })
      .filter((entry) => entry.isFile())
      .map((entry) => relative(fixturePath(''), join(entry.parentPath, entry.name))),
  );
}

describe('fixtures', () => {
  it('are all named in the README with their SHA-256', () => {
    const checksums = checksumsInReadme();
    expect([...checksums.keys()].sort()).toEqual(filesOnDisk().sort());
    for (const [path, sum] of checksums) {
      expect(createHash('sha256').update(fixtureBytes(path)).digest('hex'), path).toBe(sum);
    }
  });

  it('are what the generator makes, byte for byte', () => {
    for (const { path, bytes } of fixtureFiles()) {
      expect(Buffer.compare(fixtureBytes(path), bytes), path).toBe(0);
    }
  });
});
