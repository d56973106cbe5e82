/** "812 B", "14.2 KB", "3.1 MB", counted in steps of 1024 as file managers and the size limit do. */
export function byteWords(byteLength: number): string {
  if (byteLength < 1024) return `${byteLength} B`;
  const kilobytes = byteLength / 1024;
  return kilobytes < 1024 ? `${kilobytes.toFixed(1)} KB` : `${(kilobytes / 1024).toFixed(1)} MB`;
}
