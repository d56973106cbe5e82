/** Words and units by which a heading is known. Matched on the heading in lower case. */
export const HEADING = {
  energy: /energ|\bk?ev\b|^e$|^e[_ (\[]|implant/,
  depth:
    /depth|tiefe|position|\bedge|\bbin\b|^[xz]$|^[xz][_ (\[]|_nm\b|\bnm\b|µm|μm|\bum\b|å|angstrom/,
  sigma: /σ|sigma|\berr|error|fehler|uncert|±|\bstd|stdev|^d[ayf]$|^s$|delta/,
  value: /frac|anteil|f_?dia|diamag|rate|lambda|λ|asym|ampl|value|wert|^[fay]$/,
  note: /note|run\b|comment|remark|bemerk|label/,
  counts: /count|event|stat|^n$/,
} as const;

export function isKnownHeading(cell: string): boolean {
  const text = cell.trim().toLowerCase();
  return Object.values(HEADING).some((pattern) => pattern.test(text));
}
