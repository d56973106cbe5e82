/** A file taken into the browser: its bytes are read once and sent as they are. */
export interface ChosenFile {
  name: string;
  bytes: Uint8Array<ArrayBuffer>;
}

export async function takeFile(file: File): Promise<ChosenFile> {
  return { name: file.name, bytes: new Uint8Array(await file.arrayBuffer()) };
}

/** Pasted text becomes a file, so that what was pasted is kept like any original. */
export function fileFromText(name: string, text: string): ChosenFile {
  return { name, bytes: new TextEncoder().encode(text) };
}
