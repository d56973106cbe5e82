import { bareEnergyInText, energyInText } from './energy-in-text';
import { parseNumber } from './parse-number';
import type { Table } from './table';

/** Bare heading numbers above this can only be eV. */
const LARGEST_KEV = 200;

export type DepthUnit = 'nm' | 'A' | 'um';

/** One stopping profile to be read: the first column of a table against one other column. */
export interface StoppingColumn {
  table: Table;
  /** 0-based. */
  column: number;
  energyKeV: number | null;
}

export interface StoppingLayout {
  layout: 'matrix' | 'per-energy';
  depthUnit: DepthUnit;
  positionsAre: 'centres' | 'edges';
  weightsAre: 'counts' | 'density';
  /** One per profile, tables in order and columns from left to right; null where nothing names it. */
  energiesKeV: (number | null)[];
  /** Number that a comment such as "implanted per energy: 100000" names; null without one. */
  implantedPerEnergy: number | null;
}

/** What the files say about themselves, as far as they do; every answer may be overruled. */
export function guessStoppingLayout(tables: readonly Table[]): StoppingLayout {
  const columns = stoppingColumns(tables);
  const first = tables[0];
  const depthHeading = first?.header?.[0] ?? '';
  const words = tables
    .flatMap((table) => [...(table.header ?? []), ...table.comments.map(({ text }) => text)])
    .join('\n');
  return {
    layout: columns.length > tables.length ? 'matrix' : 'per-energy',
    depthUnit: depthUnitIn(depthHeading) ?? depthUnitInComments(tables) ?? 'nm',
    positionsAre: first && looksLikeEdges(first) ? 'edges' : 'centres',
    weightsAre: /density|dichte|pdf|per[ _]nm|\/ ?nm|nm\^?-1|nm⁻¹/i.test(words)
      ? 'density'
      : 'counts',
    energiesKeV: columns.map(({ energyKeV }) => energyKeV),
    implantedPerEnergy: implantedIn(tables),
  };
}

/**
 * The profiles in the files. A table is a matrix when two or more of its headings hold an energy,
 * or when it has more than two columns and nothing else names a single energy; otherwise its second
 * column is one profile and any further column (an error, say) is left alone.
 */
export function stoppingColumns(tables: readonly Table[]): StoppingColumn[] {
  return tables.flatMap((table) => {
    const headings = headingEnergies(table);
    const named = headings.filter((energy) => energy !== null).length;
    const single = energyInText(table.fileName) ?? energyInComments(table);
    const isMatrix = named >= 2 || (table.columnCount > 2 && single === null);
    if (!isMatrix) {
      // A heading or a name with a unit says more than a heading that is a bare number.
      const energyKeV = energyInText(table.header?.[1] ?? '') ?? single ?? headings[0] ?? null;
      return [{ table, column: 1, energyKeV }];
    }
    return headings.map((energyKeV, index) => ({ table, column: index + 1, energyKeV }));
  });
}

function headingEnergies({ header, columnCount }: Table): (number | null)[] {
  const headings = Array.from({ length: columnCount - 1 }, (_, index) => header?.[index + 1] ?? '');
  const bare = headings.map(bareEnergyInText);
  const inEV = bare.some((energy) => energy !== null && energy > LARGEST_KEV);
  return headings.map((heading, index) => {
    const number = bare[index] ?? null;
    return energyInText(heading) ?? (number !== null && inEV ? number / 1000 : number);
  });
}

function energyInComments({ comments }: Table): number | null {
  const named = comments.map(({ text }) => energyInText(text)).filter((energy) => energy !== null);
  return named.length === 1 ? (named[0] ?? null) : null;
}

function depthUnitIn(heading: string): DepthUnit | null {
  const text = heading.replace(/_/g, ' ');
  if (/(?<![a-z])nm(?![a-z])/i.test(text)) return 'nm';
  if (/[\u00b5\u03bc]m|(?<![a-z])um(?![a-z])|micron/i.test(text)) return 'um';
  return /[\u00c5\u212b]|(?<![a-z])ang(?![a-z])|(?<![A-Za-z])A(?![A-Za-z])/.test(text) ||
    /angstr/i.test(text)
    ? 'A'
    : null;
}

function depthUnitInComments(tables: readonly Table[]): DepthUnit | null {
  const about = tables
    .flatMap(({ comments }) => comments)
    .find(({ text }) => /depth|tiefe/i.test(text));
  return about ? depthUnitIn(about.text) : null;
}

/** Edges are one more than the weights: the last line gives a position and nothing else. */
function looksLikeEdges(table: Table): boolean {
  if (/edge|lower|from/i.test(table.header?.[0] ?? '')) return true;
  const cells = table.rows.at(-1)?.cells ?? [];
  const hasPosition = parseNumber(cells[0] ?? '', table.decimal) !== null;
  return hasPosition && cells.slice(1).every((cell) => cell === '');
}

function implantedIn(tables: readonly Table[]): number | null {
  for (const { comments, decimal } of tables) {
    for (const { text } of comments) {
      const match = /implanted[^\d]*([\d.,eE+]+)/i.exec(text);
      const value = match ? parseNumber(match[1] ?? '', decimal) : null;
      if (value !== null && value > 0) return value;
    }
  }
  return null;
}
