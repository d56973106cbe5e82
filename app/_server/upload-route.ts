import 'server-only';

import type { Verb } from '@/db/access/context';
import { env } from '@/lib/env';
import { AppError } from '@/lib/errors';
import { MAX_FILE_BYTES } from '@/lib/inversion/index';

import { answerRoute, type RouteHandler } from './answer-route';
import { boundedBody } from './bounded-body';
import { jsonInput, parseJson } from './json-route';
import { refuseForeignOrigin } from './same-origin';

export interface UploadedFile {
  name: string;
  bytes: Uint8Array;
}

export interface Upload {
  /** The most files at once, and the most bytes of them all together. */
  files: number;
  totalBytes: number;
  toInput: (details: object, files: UploadedFile[]) => object;
}

/**
 * A verb that takes files: multipart with `details` (JSON) and `file` (once or more). Everything is
 * bounded before it is parsed. A JSON body goes to the verb as it is.
 */
export function uploadRoute<Answer>(verb: Verb<Answer>, upload: Upload): RouteHandler {
  return answerRoute(verb.name, async (request, params, ctx) => {
    const multipart = request.headers.get('content-type')?.startsWith('multipart/form-data');
    const input = multipart
      ? await multipartInput(request, upload)
      : await jsonInput(request, params);
    return Response.json(await verb(ctx, input), { status: 201 });
  });
}

async function multipartInput(request: Request, upload: Upload): Promise<object> {
  refuseForeignOrigin(request, env.STRANDLINE_ORIGIN);
  const form = await readForm(request, upload.totalBytes);
  const details = form.get('details');
  if (typeof details !== 'string')
    throw new AppError('invalid', 'The upload lacks its details.', { details: 'Missing.' });
  const sent = form.getAll('file').filter((entry) => entry instanceof File);
  if (sent.length === 0) throw new AppError('invalid', 'Choose a file.', { file: 'Missing.' });
  if (sent.length > upload.files)
    throw new AppError('too_large', `At most ${upload.files} files are taken in at once.`);
  sent.forEach(refuseLargeFile);
  return upload.toInput(parseJson(details), await Promise.all(sent.map(uploaded)));
}

async function readForm(request: Request, totalBytes: number): Promise<FormData> {
  const body = await boundedBody(request, totalBytes);
  const headers = { 'content-type': request.headers.get('content-type') ?? '' };
  try {
    return await new Response(body, { headers }).formData();
  } catch (cause) {
    throw new AppError(
      'invalid',
      'The upload could not be read. Please send it again.',
      {},
      { cause },
    );
  }
}

function refuseLargeFile(file: File): void {
  if (file.size <= MAX_FILE_BYTES) return;
  const limit = MAX_FILE_BYTES / 1024 / 1024;
  throw new AppError('too_large', `${file.name}: too large, at most ${limit} MB a file.`);
}

async function uploaded(file: File): Promise<UploadedFile> {
  return { name: file.name, bytes: new Uint8Array(await file.arrayBuffer()) };
}
