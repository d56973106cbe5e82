import 'server-only';

import type { Verb } from '@/db/access/context';
import { env } from '@/lib/env';
import { AppError } from '@/lib/errors';

import { boundedBody } from './bounded-body';
import { answerRoute, type RouteHandler } from './answer-route';
import { refuseForeignOrigin } from './same-origin';

/** A claimed fit with 200 points and a profile of 2,000 depths stays well below. */
export const MAX_JSON_BYTES = 4 * 1024 * 1024;

/** A verb as a route handler: address, query and JSON body make its input, its answer is JSON. */
export function jsonRoute<Answer>(verb: Verb<Answer>): RouteHandler {
  return answerRoute(verb.name, async (request, params, ctx) => {
    const answer = await verb(ctx, await jsonInput(request, params));
    return Response.json(answer, { status: request.method === 'POST' ? 201 : 200 });
  });
}

export async function jsonInput(
  request: Request,
  params: Record<string, unknown>,
): Promise<Record<string, unknown>> {
  if (request.method === 'GET') {
    return { ...Object.fromEntries(new URL(request.url).searchParams), ...params };
  }
  refuseForeignOrigin(request, env.STRANDLINE_ORIGIN);
  if (!request.headers.get('content-type')?.startsWith('application/json'))
    throw new AppError('invalid', 'Expected a body of type application/json.');
  const body = parseJson(new TextDecoder().decode(await boundedBody(request, MAX_JSON_BYTES)));
  return { ...body, ...params };
}

export function parseJson(text: string): object {
  let parsed: unknown;
  try {
    parsed = JSON.parse(text);
  } catch (cause) {
    throw new AppError('invalid', 'This is not valid JSON.', {}, { cause });
  }
  if (typeof parsed !== 'object' || parsed === null || Array.isArray(parsed))
    throw new AppError('invalid', 'Expected a JSON object.');
  return parsed;
}
