import { AppError } from '@/lib/errors';

/** The body, never more than `maxBytes`: refused by its announced length, or as soon as it runs over. */
export async function boundedBody(
  request: Request,
  maxBytes: number,
): Promise<Uint8Array<ArrayBuffer>> {
  const announced = Number(request.headers.get('content-length') ?? 0);
  if (announced > maxBytes) throw tooLarge(maxBytes);
  const chunks: Uint8Array[] = [];
  let length = 0;
  const reader = request.body?.getReader();
  while (reader !== undefined) {
    const { done, value } = await reader.read();
    if (done) break;
    length += value.byteLength;
    if (length > maxBytes) {
      await reader.cancel();
      throw tooLarge(maxBytes);
    }
    chunks.push(value);
  }
  if (announced > 0 && length !== announced)
    throw new AppError('invalid', 'The upload was cut short on its way. Please send it again.');
  return joined(chunks, length);
}

function joined(chunks: readonly Uint8Array[], length: number): Uint8Array<ArrayBuffer> {
  const whole = new Uint8Array(length);
  let offset = 0;
  for (const chunk of chunks) {
    whole.set(chunk, offset);
    offset += chunk.byteLength;
  }
  return whole;
}

function tooLarge(maxBytes: number): AppError {
  const megabytes = (maxBytes / 1024 / 1024).toFixed(0);
  return new AppError('too_large', `This is too large: at most ${megabytes} MB are taken in.`);
}
