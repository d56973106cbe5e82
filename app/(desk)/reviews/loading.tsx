import { PageSkeleton } from '@/components/review/page-skeleton';

export default function Loading() {
  return <PageSkeleton what="Reading the reviews…" blocks={['line', 'line', 'line']} />;
}
