/** Whether a list holds nothing but invented data: then the list is marked once, not each row. */
export function allInvented(rows: readonly { invented: boolean }[]): boolean {
  return rows.length > 0 && rows.every((row) => row.invented);
}
