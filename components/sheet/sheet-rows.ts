/** One line of the grid. Cells are kept as typed; what they mean is for the owner of the grid. */
export interface SheetRow {
  id: number;
  cells: readonly string[];
  /** A row switched off stays and is not used. */
  on: boolean;
  /** Stored before: it can be switched off but not removed. */
  kept: boolean;
}

export interface SheetContent {
  rows: readonly SheetRow[];
  nextId: number;
}

export interface SheetLine {
  cells: readonly string[];
  on?: boolean;
  kept?: boolean;
}

/** Content from lines of cells; an empty list gives `blankRows` rows to type into. */
export function sheetContent(
  lines: readonly SheetLine[],
  columnCount: number,
  blankRows = 0,
): SheetContent {
  const blank = { cells: Array.from({ length: columnCount }, () => '') };
  const all = [...lines, ...Array.from({ length: blankRows }, () => blank)];
  const rows = all.map((line: SheetLine, index) => ({
    id: index,
    cells: line.cells,
    on: line.on ?? true,
    kept: line.kept ?? false,
  }));
  return { rows, nextId: rows.length };
}

export function withCell(
  content: SheetContent,
  rowId: number,
  column: number,
  text: string,
): SheetContent {
  const rows = content.rows.map((row) =>
    row.id === rowId ? { ...row, cells: row.cells.with(column, text) } : row,
  );
  return { ...content, rows };
}

export function withRowToggled(content: SheetContent, rowId: number): SheetContent {
  return {
    ...content,
    rows: content.rows.map((row) => (row.id === rowId ? { ...row, on: !row.on } : row)),
  };
}

export function withRowAt(content: SheetContent, index: number, columnCount: number): SheetContent {
  const row = {
    id: content.nextId,
    cells: Array.from({ length: columnCount }, () => ''),
    on: true,
    kept: false,
  };
  return { rows: content.rows.toSpliced(index, 0, row), nextId: content.nextId + 1 };
}

export function withoutRow(content: SheetContent, rowId: number): SheetContent {
  return { ...content, rows: content.rows.filter((row) => row.id !== rowId || row.kept) };
}

/** A block laid over the cells from (rowIndex, column) on; rows that are missing are added below. */
export function withBlock(
  content: SheetContent,
  rowIndex: number,
  column: number,
  block: readonly (readonly string[])[],
  columnCount: number,
): SheetContent {
  let grown = content;
  while (grown.rows.length < rowIndex + block.length) {
    grown = withRowAt(grown, grown.rows.length, columnCount);
  }
  const rows = grown.rows.map((row, index) => {
    const pasted = block[index - rowIndex];
    if (!pasted) return row;
    return { ...row, cells: row.cells.map((cell, at) => pasted[at - column] ?? cell) };
  });
  return { ...grown, rows };
}

export function isBlankRow(row: SheetRow): boolean {
  return row.cells.every((cell) => cell.trim() === '');
}
