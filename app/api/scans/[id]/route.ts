import { jsonRoute } from '@/app/_server/json-route';
import { editScan } from '@/db/access/scan/edit-scan';
import { readScan } from '@/db/access/scan/read-scan';

export const GET = jsonRoute(readScan);
export const PATCH = jsonRoute(editScan);
