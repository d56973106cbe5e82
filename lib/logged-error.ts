import pino from 'pino';

/**
 * An error with its causes, for the log. A failed query repeats its parameters in message and stack:
 * people's data, password hashes, whole files. They stay out.
 */
export function loggedError(error: unknown): unknown {
  if (!(error instanceof Error)) return error;
  const { params: _params, ...shown } = { params: undefined, ...pino.stdSerializers.err(error) };
  const secrets = parametersIn(error);
  const without = (text: string) =>
    secrets.reduce((left, secret) => left.replaceAll(`params: ${secret}`, 'params: …'), text);
  return { ...shown, message: without(shown.message), stack: without(shown.stack) };
}

function parametersIn(error: unknown): string[] {
  if (!(error instanceof Error)) return [];
  const own = 'params' in error ? [String(error.params)].filter((text) => text !== '') : [];
  return [...own, ...parametersIn(error.cause)];
}
