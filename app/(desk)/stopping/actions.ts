'use server';

import { formAction } from '@/app/_server/form-action';
import { archiveStoppingSet } from '@/db/access/stopping-set/archive-stopping-set';
import { editStoppingSet } from '@/db/access/stopping-set/edit-stopping-set';
import { restoreStoppingSet } from '@/db/access/stopping-set/restore-stopping-set';

export const editStoppingSetAction = formAction(editStoppingSet);
export const archiveStoppingSetAction = formAction(archiveStoppingSet);
export const restoreStoppingSetAction = formAction(restoreStoppingSet);
