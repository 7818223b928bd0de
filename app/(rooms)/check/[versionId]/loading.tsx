import { Skeleton, SkeletonBox, SkeletonLine, SkeletonRows } from '@/components/ui/skeleton';

export default function Loading() {
  return (
    <main id="main" className="bg-card px-4 py-4 sm:px-6 lg:ml-[284px]">
      <Skeleton words="Working out the reach, 20 000 boxes to try">
        <SkeletonLine className="mb-6 w-72" />
        <SkeletonBox className="mb-6 h-40" />
        <SkeletonRows rows={6} />
      </Skeleton>
    </main>
  );
}
