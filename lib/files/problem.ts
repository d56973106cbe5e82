/** What is wrong with a file. Lines and columns are 1-based; the message already names all three. */
export interface FileProblem {
  fileName: string;
  line: number | null;
  column: number | null;
  message: string;
}

export interface FilePlace {
  fileName: string;
  line?: number | null;
  column?: number | null;
}

/** One sentence that begins with the place: `scan.csv, line 7, column 3: expected a number, found "abc".` */
export function fileProblem(place: FilePlace, sentence: string): FileProblem {
  const { fileName, line = null, column = null } = place;
  const parts = [fileName];
  if (line !== null) parts.push(`line ${line}`);
  if (column !== null) parts.push(`column ${column}`);
  return { fileName, line, column, message: `${parts.join(', ')}: ${sentence}` };
}
