import { downloadRoute } from '@/app/_server/download-route';
import { exportProfile } from '@/db/access/profile/export-profile';

export const GET = downloadRoute(exportProfile, ({ fileName, csv }) => ({
  name: fileName,
  body: csv,
  type: 'text/csv; charset=utf-8; header=present',
}));
