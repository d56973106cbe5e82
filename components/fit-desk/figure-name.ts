/** Names joined to a file name that every system takes. */
export function figureName(...names: readonly string[]): string {
  return (
    names
      .join('-')
      .normalize('NFKD')
      .toLowerCase()
      .replace(/[^a-z0-9]+/g, '-')
      .replace(/^-+|-+$/g, '')
      .slice(0, 60) || 'figure'
  );
}
