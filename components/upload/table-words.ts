import type { Table } from '@/lib/files/table';

/** What was found in a file besides its cells: "13 lines of 3 columns, heading on line 2, 1 comment line". */
export function tableWords({ rows, columnCount, header, headerLine, comments }: Table): string {
  const parts = [`${count(rows.length, 'line')} of ${count(columnCount, 'column')}`];
  parts.push(header ? `heading on line ${headerLine ?? 1}` : 'no heading');
  if (comments.length > 0) parts.push(count(comments.length, 'comment line'));
  return parts.join(', ');
}

function count(howMany: number, what: string): string {
  return `${howMany.toLocaleString('en')} ${what}${howMany === 1 ? '' : 's'}`;
}
