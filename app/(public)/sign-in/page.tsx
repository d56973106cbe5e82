import type { Metadata } from 'next';
import { redirect } from 'next/navigation';

import { safePath } from '@/app/_server/safe-path';
import { currentViewer } from '@/app/_server/viewer';
import { EntrySheet } from '@/components/person/entry-sheet';
import { SignInForm } from '@/components/person/sign-in-form';
import { TextLink } from '@/components/ui/text-link';

import { signInAction } from '../actions';

export const metadata: Metadata = { title: 'Sign in' };

export default async function SignInPage({ searchParams }: PageProps<'/sign-in'>) {
  const next = safePath((await searchParams).next);
  if (await currentViewer()) redirect(next);
  return (
    <EntrySheet
      title="Sign in"
      lead="Carrier profiles near a semiconductor surface, from energy scans with low-energy muons."
      after={
        <>
          No account? <TextLink href="/sign-up">Make a team</TextLink>, or ask the owner of a team
          for an invitation.
        </>
      }
    >
      <SignInForm action={signInAction} next={next} />
    </EntrySheet>
  );
}
