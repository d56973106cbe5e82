import { PageLoading } from '@/components/shell/page-loading';

export default function SessionsLoading() {
  return <PageLoading />;
}
