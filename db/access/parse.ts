import 'server-only';

import { AppError } from '@/lib/errors';
import { z } from 'zod';

/** The input of a verb, checked once. The first problem is the message; all are in `fields`. */
export function parse<Schema extends z.ZodType>(schema: Schema, input: unknown): z.output<Schema> {
  const parsed = schema.safeParse(input);
  if (parsed.success) return parsed.data;
  const fields: Record<string, string> = {};
  for (const issue of parsed.error.issues) fields[issue.path.join('.')] ??= issue.message;
  throw new AppError(
    'invalid',
    parsed.error.issues[0]?.message ?? 'Expected something else.',
    fields,
  );
}
