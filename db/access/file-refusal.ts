import { AppError } from '@/lib/errors';
import type { FileProblem } from '@/lib/files/problem';

const MOST_NAMED = 200;

/** Every bad row by its place; the message carries the first sentence and how many follow. */
export function fileRefusal(problems: readonly FileProblem[]): AppError {
  const fields: Record<string, string> = {};
  for (const problem of problems.slice(0, MOST_NAMED)) fields[placeOf(problem)] ??= problem.message;
  const [first, ...others] = problems;
  const more =
    others.length === 0
      ? ''
      : ` There ${others.length === 1 ? 'is' : 'are'} ${others.length} more.`;
  return new AppError('invalid', `${first?.message ?? 'The file cannot be read.'}${more}`, fields);
}

function placeOf({ fileName, line, column }: FileProblem): string {
  const parts = [fileName];
  if (line !== null) parts.push(`line ${line}`);
  if (column !== null) parts.push(`column ${column}`);
  return parts.join(', ');
}
