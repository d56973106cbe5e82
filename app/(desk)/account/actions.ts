'use server';

import { formAction } from '@/app/_server/form-action';
import { revokeSession } from '@/db/access/person/revoke-session';

export const revokeSessionAction = formAction(revokeSession);
