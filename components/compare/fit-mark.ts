/** How one fit is told from the others: a letter, a line and a colour, so that colour never stands alone. */
export interface FitMark {
  letter: string;
  style: 'solid' | 'dashed';
  /** CSS colour, a theme variable. */
  colour: string;
}

const COLOURS = [
  'var(--coral)',
  'var(--tide)',
  'var(--kelp)',
  'var(--amber)',
  'var(--ink)',
  'var(--ink-2)',
  'var(--ink-3)',
  'var(--coral)',
];

/** The first fit is the solid coral one, as on the fit desk; all others are dashed. */
export function fitMark(position: number): FitMark {
  return {
    letter: String.fromCharCode(65 + position),
    style: position === 0 ? 'solid' : 'dashed',
    colour: COLOURS[position % COLOURS.length] ?? 'var(--ink)',
  };
}
