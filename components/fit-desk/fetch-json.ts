/** A refusal of the server, in its own words. */
export class ServerRefusal extends Error {
  constructor(
    readonly code: string,
    message: string,
    readonly fields: Record<string, string> = {},
  ) {
    super(message);
  }
}

/** JSON from a route of this product; throws the server's own sentence when it refuses. */
export async function fetchJson<Answer>(path: string, init?: RequestInit): Promise<Answer> {
  const response = await fetch(path, init).catch(() => {
    throw new ServerRefusal(
      'offline',
      'The server could not be reached. Nothing was lost here; try again in a moment.',
    );
  });
  const body: unknown = await response.json().catch(() => null);
  if (response.ok) return body as Answer;
  throw refusalOf(body, response.status);
}

export function refusalOf(body: unknown, status: number): ServerRefusal {
  const error = typeof body === 'object' && body !== null && 'error' in body ? body.error : null;
  if (
    typeof error === 'object' &&
    error !== null &&
    'message' in error &&
    typeof error.message === 'string'
  ) {
    const code = 'code' in error && typeof error.code === 'string' ? error.code : 'unexpected';
    const fields = 'fields' in error ? (error.fields as Record<string, string>) : {};
    return new ServerRefusal(code, error.message, fields);
  }
  return new ServerRefusal(
    'unexpected',
    `The server answered with status ${status} and no reason. Nothing was lost here.`,
  );
}
