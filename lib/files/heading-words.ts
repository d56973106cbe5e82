/** Words and units by which a heading is known. Matched on the heading in lower case. */
export const HEADING = {
  energy: /energ|\bk?ev\b|^e$|^e[_ (\[]|implant/,
  depth:
    /depth|tiefe|position|\bedge|\bbin\b|^[xz]$|^[xz][_ (\[]|_nm\b|\bnm\b|µm|μm|\bum\b|å|angstrom/,
  sigma: /σ|sigma|(?<![a-z])err|fehler|uncert|±|(?<![a-z])std|stdev|^d[ayf]$|^s$|delta/,
  value:
    /(?<![a-z])frac|anteil|f_?dia|diamag|(?<![a-z])rate|lambda|λ|asym|(?<![a-z])ampl|value|wert|^[fay]$/,
  note: /(?<![a-z])note|(?<![a-z])run(?![a-z])|comment|remark|bemerk|label/,
  counts: /(?<![a-z])count|(?<![a-z])event|statistics|^n$/,
} as const;

export function isKnownHeading(cell: string): boolean {
  const text = cell.trim().toLowerCase();
  return Object.values(HEADING).some((pattern) => pattern.test(text));
}
