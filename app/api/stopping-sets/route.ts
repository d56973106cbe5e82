import { jsonRoute } from '@/app/_server/json-route';
import { stoppingUpload } from '@/app/_server/stopping-upload';
import { uploadRoute } from '@/app/_server/upload-route';
import { createStoppingSet } from '@/db/access/stopping-set/create-stopping-set';
import { listStoppingSets } from '@/db/access/stopping-set/list-stopping-sets';

export const GET = jsonRoute(listStoppingSets);
export const POST = uploadRoute(createStoppingSet, stoppingUpload);
