import { endianness } from 'node:os';

if (endianness() !== 'LE') throw new Error('Stopping profiles are stored little-endian.');

/** Numbers as the bytes of little-endian 64-bit floats: exact, and a third of their JSON. */
export function toBlob(numbers: Float64Array): Buffer {
  return Buffer.from(numbers.buffer, numbers.byteOffset, numbers.byteLength);
}

export function fromBlob(blob: Uint8Array): Float64Array {
  // Copied: a blob may start anywhere in its buffer, a Float64Array only at a multiple of eight.
  return new Float64Array(Uint8Array.from(blob).buffer);
}
