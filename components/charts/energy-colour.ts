const STOPS = 5;

/**
 * Colour of an implantation energy, from shallow pale teal to deep ink violet, as a CSS colour mixed
 * from the six stops of the theme (`--energy-0` to `--energy-5`), which differ in light and dark.
 */
export function energyColour(energyKeV: number, [min, max]: readonly [number, number]): string {
  const share = max > min ? Math.min(1, Math.max(0, (energyKeV - min) / (max - min))) : 0.5;
  const stop = Math.min(STOPS - 1, Math.floor(share * STOPS));
  const towards = ((share * STOPS - stop) * 100).toFixed(1);
  return `color-mix(in oklab, var(--energy-${stop + 1}) ${towards}%, var(--energy-${stop}))`;
}

/** Lowest and highest energy of a list, for `energyColour`; [0, 1] when the list is empty. */
export function energyRange(energiesKeV: readonly number[]): [number, number] {
  if (energiesKeV.length === 0) return [0, 1];
  return [Math.min(...energiesKeV), Math.max(...energiesKeV)];
}
