import { PageLoading } from '@/components/shell/page-loading';

export default function TeamLoading() {
  return <PageLoading />;
}
