import 'server-only';

import { AppError } from '@/lib/errors';
import { log } from '@/lib/log';

/** What a person reads of an error: a refusal as it is, anything else in general words and in the log. */
export function failureOf(error: unknown, during: string): AppError {
  if (error instanceof AppError && error.code !== 'unexpected') return error;
  log.error({ err: error, during }, 'Something failed that should not have.');
  const message = 'Something went wrong on the server. Nothing was changed. Please try again.';
  return new AppError('unexpected', message, {}, { cause: error });
}
