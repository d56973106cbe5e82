/** Hands a file to the browser to be saved. */
export function saveAs(fileName: string, blob: Blob): void {
  const link = document.createElement('a');
  link.href = URL.createObjectURL(blob);
  link.download = fileName;
  link.click();
  // The browser reads the address after this turn.
  setTimeout(() => URL.revokeObjectURL(link.href), 10_000);
}
