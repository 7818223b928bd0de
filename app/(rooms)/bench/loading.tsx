import { Skeleton, SkeletonLine, SkeletonRows } from '@/components/ui/skeleton';

export default function Loading() {
  return (
    <main id="main" className="mx-auto max-w-desk px-4 py-6 sm:px-6">
      <Skeleton words="Fetching the bench">
        <SkeletonLine className="mb-6 w-48" />
        <SkeletonRows rows={8} />
      </Skeleton>
    </main>
  );
}
