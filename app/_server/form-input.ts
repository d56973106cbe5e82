/**
 * Form fields as the object that a verb parses: `meta.name` becomes `{ meta: { name } }`, a repeated
 * field a list. Fields that React adds for itself are left out.
 */
export function formInput(data: FormData | object): object {
  if (!(data instanceof FormData)) return data;
  const root: Record<string, unknown> = Object.create(null);
  for (const name of new Set(data.keys())) {
    if (name.startsWith('$ACTION')) continue;
    const values = data.getAll(name);
    place(root, name.split('.'), values.length === 1 ? values[0] : values);
  }
  return root;
}

function place(into: Record<string, unknown>, path: readonly string[], value: unknown): void {
  const [first, ...rest] = path;
  if (first === undefined) return;
  if (rest.length === 0) {
    into[first] = value;
    return;
  }
  const inner = into[first];
  const next: Record<string, unknown> = isRecord(inner) ? inner : Object.create(null);
  into[first] = next;
  place(next, rest, value);
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
