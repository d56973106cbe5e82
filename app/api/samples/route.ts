import { jsonRoute } from '@/app/_server/json-route';
import { listSamples } from '@/db/access/sample/list-samples';

export const GET = jsonRoute(listSamples);
