'use server';

import { formAction } from '@/app/_server/form-action';
import { acceptFit } from '@/db/access/review/accept-fit';
import { commentFit } from '@/db/access/review/comment-fit';
import { returnFit } from '@/db/access/review/return-fit';
import { submitFit } from '@/db/access/review/submit-fit';

export const submitFitAction = formAction(submitFit);
// Once accepted the review page has no dialog left that could lead on, so the server does.
export const acceptFitAction = formAction(acceptFit, {
  redirectTo: ({ issuedProfileId }) => `/profiles/${issuedProfileId}`,
});
export const returnFitAction = formAction(returnFit);
export const commentFitAction = formAction(commentFit);
