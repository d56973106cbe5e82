'use server';

import { formAction } from '@/app/_server/form-action';
import { archiveScan } from '@/db/access/scan/archive-scan';
import { restoreScan } from '@/db/access/scan/restore-scan';

export const archiveScanAction = formAction(archiveScan);
export const restoreScanAction = formAction(restoreScan);
