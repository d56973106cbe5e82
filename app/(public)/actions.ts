'use server';

import { endSessionAction, sessionAction } from '@/app/_server/form-action';
import { acceptInvitation } from '@/db/access/person/accept-invitation';
import { signIn } from '@/db/access/person/sign-in';
import { signOut } from '@/db/access/person/sign-out';
import { signUp } from '@/db/access/person/sign-up';

export const signUpAction = sessionAction(signUp);
export const signInAction = sessionAction(signIn);
export const acceptInvitationAction = sessionAction(acceptInvitation);
export const signOutAction = endSessionAction(signOut);
