/** The most fits that one comparison takes; the schema of the verb says the same. */
export const MOST_FITS = 8;

/** The fits of a comparison live in its address, in order: the first one is drawn solid. */
export function compareAddress(ids: readonly string[]): string {
  return ids.length === 0 ? '/compare' : `/compare?fits=${ids.join(',')}`;
}

/** Ids in an address, in order, without blanks and repeats. */
export function idsInAddress(value: string | string[] | undefined): string[] {
  const joined = Array.isArray(value) ? value.join(',') : (value ?? '');
  return [
    ...new Set(
      joined
        .split(',')
        .map((id) => id.trim())
        .filter((id) => id !== ''),
    ),
  ];
}

export function withFirst(ids: readonly string[], id: string): string[] {
  return [id, ...ids.filter((other) => other !== id)];
}

export function without(ids: readonly string[], id: string): string[] {
  return ids.filter((other) => other !== id);
}
