import 'server-only';

import type { Context } from '@/db/access/context';
import { STATUS_BY_CODE } from '@/lib/errors';

import { requestContext } from './context';
import { failureOf } from './failure';

type Params = Record<string, string | string[] | undefined>;
export type RouteHandler = (
  request: Request,
  route: { params: Promise<Params> },
) => Promise<Response>;

/** Runs a route handler; what it throws becomes `{ error: { code, message, fields } }`. */
export function answerRoute(
  name: string,
  handle: (request: Request, params: Params, ctx: Context) => Promise<Response>,
): RouteHandler {
  return async (request, route) => {
    try {
      const response = await handle(request, await route.params, await requestContext());
      response.headers.set('cache-control', 'private, no-store');
      response.headers.set('x-content-type-options', 'nosniff');
      return response;
    } catch (error) {
      const { code, message, fields } = failureOf(error, name);
      const status = STATUS_BY_CODE[code];
      const headers = { 'cache-control': 'private, no-store' };
      return Response.json({ error: { code, message, fields } }, { status, headers });
    }
  };
}
