import 'server-only';

import type { FormState } from '@/components/ui/form-state';
import type { Verb } from '@/db/access/context';
import type { StartedSession } from '@/db/access/session';
import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';

import { requestContext } from './context';
import { failureOf } from './failure';
import { formInput } from './form-input';
import { safePath } from './safe-path';
import { clearSessionCookie, setSessionCookie } from './session-cookie';

export interface FormActionOptions<Answer> {
  /** Where to go afterwards. */
  redirectTo?: (answer: Answer) => string;
  /** Paths whose pages show something else now; every page by default. */
  revalidate?: string[];
}

export type FormAction<Answer> = (
  previous: FormState,
  data: FormData | object,
) => Promise<FormState<Answer>>;

/** A verb as a server action for useActionState. Refusals are answers: thrown ones lose their words. */
export function formAction<Answer>(
  verb: Verb<Answer>,
  options: FormActionOptions<Answer> = {},
): FormAction<Answer> {
  return async (_previous, data) => {
    const answer = await answerOf(verb, formInput(data));
    if (answer === null || !answer.ok) return answer;
    if (options.revalidate === undefined) revalidatePath('/', 'layout');
    else for (const path of options.revalidate) revalidatePath(path);
    if (options.redirectTo) redirect(options.redirectTo(answer.answer));
    return answer;
  };
}

/** A verb that starts a session: the token goes into the cookie and nowhere else. */
export function sessionAction(verb: Verb<StartedSession>): FormAction<null> {
  return async (_previous, data) => {
    const input = formInput(data);
    const answer = await answerOf(verb, input);
    if (!answer.ok) return answer;
    await setSessionCookie(answer.answer);
    redirect(safePath('next' in input ? input.next : '/'));
  };
}

/** A verb that ends the session of this browser. */
export function endSessionAction(verb: Verb<null>): FormAction<null> {
  return async (_previous, data) => {
    const answer = await answerOf(verb, formInput(data));
    if (!answer.ok && answer.code !== 'unauthenticated') return answer;
    await clearSessionCookie();
    redirect('/sign-in');
  };
}

async function answerOf<Answer>(verb: Verb<Answer>, input: object) {
  try {
    return { ok: true as const, answer: await verb(await requestContext(), input) };
  } catch (error) {
    const { code, message, fields } = failureOf(error, verb.name);
    return { ok: false as const, code, message, fields };
  }
}
