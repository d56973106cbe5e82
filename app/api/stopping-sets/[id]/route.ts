import { jsonRoute } from '@/app/_server/json-route';
import { readStoppingSet } from '@/db/access/stopping-set/read-stopping-set';

export const GET = jsonRoute(readStoppingSet);
