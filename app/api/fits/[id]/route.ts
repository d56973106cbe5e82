import { jsonRoute } from '@/app/_server/json-route';
import { readFit } from '@/db/access/fit/read-fit';

export const GET = jsonRoute(readFit);
