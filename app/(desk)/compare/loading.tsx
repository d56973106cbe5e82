import { PageSkeleton } from '@/components/review/page-skeleton';

export default function Loading() {
  return (
    <PageSkeleton what="Putting the fits over each other…" blocks={['line', 'figure', 'line']} />
  );
}
