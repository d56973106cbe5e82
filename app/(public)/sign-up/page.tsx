import type { Metadata } from 'next';
import { redirect } from 'next/navigation';

import { currentViewer } from '@/app/_server/viewer';
import { EntrySheet } from '@/components/person/entry-sheet';
import { SignUpForm } from '@/components/person/sign-up-form';
import { TextLink } from '@/components/ui/text-link';

import { signUpAction } from '../actions';

export const metadata: Metadata = { title: 'Make a team' };

export default async function SignUpPage() {
  if (await currentViewer()) redirect('/');
  return (
    <EntrySheet
      title="Make a team"
      lead="A team shares its samples, energy scans, stopping sets, fits and issued profiles. Nobody outside sees them."
      after={
        <>
          You have an account? <TextLink href="/sign-in">Sign in</TextLink>.
        </>
      }
    >
      <SignUpForm action={signUpAction} />
    </EntrySheet>
  );
}
