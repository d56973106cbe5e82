/** How the cells of a line are told apart; `blanks` is one or more spaces or tabs. */
export type Delimiter = 'comma' | 'semicolon' | 'tab' | 'blanks';

export type Decimal = 'point' | 'comma';

export interface TableRow {
  /** 1-based line of the original file. */
  line: number;
  cells: string[];
}

/** A text file as lines of cells: nothing is a number yet, and every row knows its line. */
export interface Table {
  fileName: string;
  delimiter: Delimiter;
  decimal: Decimal;
  header: string[] | null;
  headerLine: number | null;
  comments: { line: number; text: string }[];
  rows: TableRow[];
  columnCount: number;
}
