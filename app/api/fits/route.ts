import { jsonRoute } from '@/app/_server/json-route';
import { listFits } from '@/db/access/fit/list-fits';
import { saveFit } from '@/db/access/fit/save-fit';

export const GET = jsonRoute(listFits);
export const POST = jsonRoute(saveFit);
