import 'server-only';

import type { Verb } from '@/db/access/context';
import { AppError } from '@/lib/errors';
import { headers } from 'next/headers';
import { notFound, redirect } from 'next/navigation';

import { requestContext } from './context';
import { PATH_HEADER } from './path-header';

/** Reads through a verb for a page: signed out goes to sign-in and back, not visible is not found. */
export async function read<Answer>(verb: Verb<Answer>, input: unknown = {}): Promise<Answer> {
  const ctx = await requestContext();
  try {
    return await verb(ctx, input);
  } catch (error) {
    if (!(error instanceof AppError)) throw error;
    if (error.code === 'unauthenticated') redirect(await signInPath());
    if (error.code === 'not_found') notFound();
    if (error.code === 'invalid' && 'id' in error.fields) notFound();
    throw error;
  }
}

async function signInPath(): Promise<string> {
  const here = (await headers()).get(PATH_HEADER) ?? '/';
  return here === '/' ? '/sign-in' : `/sign-in?next=${encodeURIComponent(here)}`;
}
