import { env } from '@/lib/env';
import pino from 'pino';

import { loggedError } from './logged-error';

/** One line of JSON per event on standard output; `err` carries the whole chain of causes. */
export const log = pino({
  level: env.STRANDLINE_LOG_LEVEL ?? (env.NODE_ENV === 'test' ? 'fatal' : 'info'),
  base: undefined,
  serializers: { err: loggedError },
});
