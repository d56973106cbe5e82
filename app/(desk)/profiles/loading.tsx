import { PageSkeleton } from '@/components/review/page-skeleton';

export default function Loading() {
  return <PageSkeleton what="Reading the issued profiles…" blocks={['line', 'line', 'line']} />;
}
