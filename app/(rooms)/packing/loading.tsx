import { Skeleton, SkeletonRows } from '@/components/ui/skeleton';

export default function Loading() {
  return (
    <main id="main" className="px-4 py-6 sm:px-7">
      <Skeleton words="Fetching the boxes">
        <SkeletonRows rows={6} />
      </Skeleton>
    </main>
  );
}
