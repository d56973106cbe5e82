import { PageLoading } from '@/components/shell/page-loading';

export default function SamplesLoading() {
  return <PageLoading />;
}
