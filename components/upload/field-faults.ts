import type { z } from 'zod';

/** The first fault of each field by its name, from the schema that the server uses too. */
export function fieldFaults(schema: z.ZodType, value: unknown): Record<string, string> {
  const parsed = schema.safeParse(value);
  if (parsed.success) return {};
  const faults: Record<string, string> = {};
  for (const issue of parsed.error.issues) faults[issue.path.join('.')] ??= issue.message;
  return faults;
}

/** Faults that a server names as `meta.name` belong to the field `name`. */
export function withoutPrefix(
  faults: Record<string, string>,
  prefix: string,
): Record<string, string> {
  return Object.fromEntries(
    Object.entries(faults).map(([name, fault]) => [
      name.startsWith(prefix) ? name.slice(prefix.length) : name,
      fault,
    ]),
  );
}
