'use server';

import { formAction } from '@/app/_server/form-action';
import { archiveSample } from '@/db/access/sample/archive-sample';
import { createSample } from '@/db/access/sample/create-sample';
import { editSample } from '@/db/access/sample/edit-sample';
import { restoreSample } from '@/db/access/sample/restore-sample';

export const createSampleAction = formAction(createSample, {
  redirectTo: ({ id }) => `/samples/${id}`,
});
export const editSampleAction = formAction(editSample, {
  redirectTo: ({ id }) => `/samples/${id}`,
});
export const archiveSampleAction = formAction(archiveSample);
export const restoreSampleAction = formAction(restoreSample);
