import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { view } from '@/app/view';
import { EmptyQueue } from '@/components/check/empty-queue';
import { QueueList } from '@/components/check/queue-list';
import { readQueue } from '@/services/check';

export const metadata: Metadata = { title: 'Check room' };

/** The oldest version that waits lies on the table; own work only when nothing else does. */
export default async function CheckPage() {
  const queue = await view(readQueue);
  const first = queue.waiting.find((entry) => !entry.own) ?? queue.waiting[0];
  if (first) redirect(`/check/${first.versionId}`);
  return (
    <main id="main" className="md:grid md:min-h-[calc(100dvh-60px)] md:grid-cols-[284px_minmax(0,1fr)]">
      <QueueList queue={queue} current={null} />
      <EmptyQueue />
    </main>
  );
}
