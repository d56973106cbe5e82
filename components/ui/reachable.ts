import type { FormActionFunction } from './form-state';

/**
 * The same action, answering in words when the server cannot be reached: the page and what was typed stay.
 * A failed fetch is a TypeError by the Fetch standard; anything else is not ours to explain.
 */
export function reachable<Answer>(action: FormActionFunction<Answer>): FormActionFunction<Answer> {
  return async (previous, data) => {
    try {
      return await action(previous, data);
    } catch (error) {
      if (!(error instanceof TypeError)) throw error;
      const message = 'The server could not be reached. Nothing was lost here; try again.';
      return { ok: false, message, fields: {} };
    }
  };
}
