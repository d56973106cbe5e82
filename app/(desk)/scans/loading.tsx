import { PageSkeleton } from '@/components/review/page-skeleton';

export default function Loading() {
  return <PageSkeleton what="Loading…" blocks={['line', 'figure', 'line']} />;
}
