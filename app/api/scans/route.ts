import { jsonRoute } from '@/app/_server/json-route';
import { scanUpload } from '@/app/_server/scan-upload';
import { uploadRoute } from '@/app/_server/upload-route';
import { createScan } from '@/db/access/scan/create-scan';
import { listScans } from '@/db/access/scan/list-scans';

export const GET = jsonRoute(listScans);
export const POST = uploadRoute(createScan, scanUpload);
