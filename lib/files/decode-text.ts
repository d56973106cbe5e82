import { MAX_FILE_BYTES } from '@/lib/inversion/index';
import { fileProblem, type FileProblem } from './problem';

export type Decoded = { ok: true; lines: string[] } | { ok: false; problem: FileProblem };

/**
 * The lines of a UTF-8 text file, without byte-order mark and line ends (LF, CR LF or CR).
 * Refuses what is too large, empty, binary, or in another encoding, each with its own sentence.
 */
export function decodeText(fileName: string, bytes: Uint8Array): Decoded {
  const tooLarge = sizeProblem(fileName, bytes.length);
  if (tooLarge) return { ok: false, problem: tooLarge };
  const reason = whyNotText(bytes);
  if (reason !== null) return { ok: false, problem: fileProblem({ fileName }, reason) };
  try {
    const text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
    if (text.trim() === '') {
      return {
        ok: false,
        problem: fileProblem({ fileName }, 'the file holds no text, only blanks.'),
      };
    }
    // DOS programs end a text with Ctrl-Z.
    return { ok: true, lines: text.replace(/\u001a\s*$/, '').split(/\r\n|\n|\r/) };
  } catch (cause) {
    if (!(cause instanceof TypeError)) throw cause;
    return { ok: false, problem: notUtf8(fileName, bytes) };
  }
}

/** Whether a file is too large to be taken in; its size is enough to tell, so no byte need be read. */
export function sizeProblem(fileName: string, byteLength: number): FileProblem | null {
  if (byteLength <= MAX_FILE_BYTES) return null;
  const limit = megabytes(MAX_FILE_BYTES);
  const sentence = `the file has ${megabytes(byteLength)} MB; the limit is ${limit} MB.`;
  return fileProblem({ fileName }, sentence);
}

function whyNotText(bytes: Uint8Array): string | null {
  if (bytes.length === 0) return 'the file is empty.';
  const [first, second, third] = bytes;
  if ((first === 0xff && second === 0xfe) || (first === 0xfe && second === 0xff)) {
    return 'the file is UTF-16 text; save it as UTF-8 (in a spreadsheet: “CSV UTF-8”).';
  }
  if (first === 0x50 && second === 0x4b && (third === 3 || third === 5)) {
    return 'the file is a workbook or an archive, not text; export the sheet as CSV.';
  }
  if (bytes.some(isBinaryByte)) return 'the file is binary, not text; expected a table of numbers.';
  return null;
}

/** Control characters that no text file has; tab, line ends and form feed are text. */
function isBinaryByte(byte: number): boolean {
  return byte < 9 || (byte > 13 && byte < 32 && byte !== 26);
}

function notUtf8(fileName: string, bytes: Uint8Array): FileProblem {
  return fileProblem(
    { fileName, line: firstLineNotUtf8(bytes) },
    'the line holds characters that are not UTF-8 text; save the file as UTF-8.',
  );
}

function firstLineNotUtf8(bytes: Uint8Array): number {
  // A replacement character per bad byte: everything before the first one decoded cleanly.
  const lenient = new TextDecoder('utf-8').decode(bytes);
  return lenient.slice(0, lenient.indexOf('\ufffd')).split(/\r\n|\n|\r/).length;
}

function megabytes(count: number): string {
  // Rounded up, so that a file just over the limit never reads as being at it.
  return String(Math.ceil((count / (1024 * 1024)) * 100) / 100);
}
