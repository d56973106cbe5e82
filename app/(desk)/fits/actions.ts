'use server';

import { formAction } from '@/app/_server/form-action';
import { discardFit } from '@/db/access/fit/discard-fit';

export const discardFitAction = formAction(discardFit, { redirectTo: () => '/fits' });
