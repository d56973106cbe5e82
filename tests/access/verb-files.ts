import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

const ROOT = join(import.meta.dirname, '../../db/access');

/**
 * The names of all verbs, found in the sources: a file `accept-fit.ts` in a folder of db/access that
 * exports `acceptFit(ctx: Context, …input: unknown)`.
 */
export function verbNames(): string[] {
  const folders = readdirSync(ROOT, { withFileTypes: true }).filter((entry) => entry.isDirectory());
  return folders
    .flatMap(({ name }) => readdirSync(join(ROOT, name)).map((file) => join(ROOT, name, file)))
    .flatMap((path) => {
      const name = camelCase(path);
      const signature = `export (async )?function ${name}\\(\\s*ctx: Context,\\s*_?input: unknown`;
      return new RegExp(signature).test(readFileSync(path, 'utf8')) ? [name] : [];
    })
    .sort();
}

/** Every exported function whose first argument is a context, wherever in db/access it stands. */
export function functionsOfContext(): string[] {
  const folders = readdirSync(ROOT, { withFileTypes: true, recursive: true });
  const files = folders.filter((entry) => entry.isFile() && entry.name.endsWith('.ts'));
  return files
    .flatMap(({ parentPath, name }) => {
      const source = readFileSync(join(parentPath, name), 'utf8');
      return [
        ...source.matchAll(/export (?:async )?function (\w+)\(\s*ctx: Context,\s*_?input: /g),
      ].map((match) => match[1] ?? '');
    })
    .sort();
}

function camelCase(path: string): string {
  const base = path.split('/').at(-1)?.replace(/\.ts$/, '') ?? '';
  return base.replace(/-(\w)/g, (_, letter: string) => letter.toUpperCase());
}
