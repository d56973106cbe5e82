import type { ChosenFile } from './chosen-file';

export type Sent =
  { ok: true; id: string } | { ok: false; message: string; fields: Record<string, string> };

/** Sends `details` as JSON and the files beside it; every outcome comes back as a value. */
export function sendUpload(
  path: string,
  details: unknown,
  files: readonly ChosenFile[],
): Promise<Sent> {
  const body = new FormData();
  body.set('details', JSON.stringify(details));
  for (const file of files)
    body.append('file', new Blob([file.bytes], { type: 'text/plain' }), file.name);
  return send(path, { method: 'POST', body });
}

export function sendJson(path: string, method: 'POST' | 'PATCH', details: unknown): Promise<Sent> {
  return send(path, {
    method,
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify(details),
  });
}

const NOT_REACHED =
  'The server could not be reached. Nothing was stored and nothing here is lost; try again.';

async function send(path: string, request: RequestInit): Promise<Sent> {
  let response: Response;
  try {
    response = await fetch(path, request);
  } catch {
    // fetch rejects only when no answer came at all.
    return { ok: false, message: NOT_REACHED, fields: {} };
  }
  const answer: unknown = await response.json().catch(() => null);
  if (response.ok && hasId(answer)) return { ok: true, id: answer.id };
  return refusal(answer, response.status);
}

function hasId(answer: unknown): answer is { id: string } {
  return isObject(answer) && typeof answer.id === 'string';
}

function refusal(answer: unknown, status: number): Sent {
  const error = isObject(answer) && isObject(answer.error) ? answer.error : {};
  const message =
    typeof error.message === 'string'
      ? error.message
      : `The server answered with status ${status} and no reason. Nothing was stored and nothing here is lost.`;
  const fields = isObject(error.fields) ? error.fields : {};
  const named = Object.entries(fields).filter(
    (entry): entry is [string, string] => typeof entry[1] === 'string',
  );
  return { ok: false, message, fields: Object.fromEntries(named) };
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}
