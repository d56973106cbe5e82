/** `12.5keV`, `12,5 keV`, `12p5keV`, `E_4000eV`; not the tail of a longer number or word. */
const WITH_UNIT = /(?<![\d.,])(\d+(?:[.,p]\d+)?)[ _]*(k?)eV(?![a-z])/i;
const BARE = /^\s*(?:e\s*[=_:]?\s*)?(\d+(?:[.,]\d+)?)\s*$/i;

/** The energy in keV that a heading or a file name states with its unit; null when it does not. */
export function energyInText(text: string): number | null {
  const match = WITH_UNIT.exec(text);
  if (!match) return null;
  const value = Number((match[1] ?? '').replace(/[,p]/i, '.'));
  return match[2] === '' ? value / 1000 : value;
}

/** A heading that is nothing but a number (or E and a number); its unit is for the caller to settle. */
export function bareEnergyInText(text: string): number | null {
  const match = BARE.exec(text);
  return match ? Number((match[1] ?? '').replace(',', '.')) : null;
}
