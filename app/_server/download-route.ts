import 'server-only';

import type { Verb } from '@/db/access/context';

import { answerRoute, type RouteHandler } from './answer-route';
import { jsonInput } from './json-route';

export interface Download {
  name: string;
  body: string | Uint8Array;
  type: string;
}

/** A verb whose answer is kept as a file by the browser. */
export function downloadRoute<Answer>(
  verb: Verb<Answer>,
  toDownload: (answer: Answer) => Download,
): RouteHandler {
  return answerRoute(verb.name, async (request, params, ctx) => {
    const { name, body, type } = toDownload(await verb(ctx, await jsonInput(request, params)));
    const content = typeof body === 'string' ? body : new Uint8Array(body);
    return new Response(content, {
      headers: {
        'content-type': type,
        'content-disposition': disposition(name),
      },
    });
  });
}

/** RFC 6266: a plain name for old readers, the real one in UTF-8 (RFC 8187) beside it. */
function disposition(name: string): string {
  const plain = name.replace(/[^\w.\- ]/g, '_');
  const encoded = encodeURIComponent(name).replace(
    /['()*!]/g,
    (mark) => `%${mark.charCodeAt(0).toString(16).toUpperCase()}`,
  );
  return `attachment; filename="${plain}"; filename*=UTF-8''${encoded}`;
}
