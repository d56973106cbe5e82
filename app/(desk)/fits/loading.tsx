import { PageLoading } from '@/components/shell/page-loading';

export default function Loading() {
  return <PageLoading />;
}
