import { downloadRoute } from '@/app/_server/download-route';
import { readFile } from '@/db/access/file/read-file';

export const GET = downloadRoute(readFile, ({ name, bytes }) => ({
  name,
  body: bytes,
  type: 'application/octet-stream',
}));
