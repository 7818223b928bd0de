import type { Metadata } from 'next';
import { view } from '@/app/view';
import { DecidedList } from '@/components/check/decided-list';
import { listDecided } from '@/services/check';

export const metadata: Metadata = { title: 'Released versions' };

export default async function ReleasedPage() {
  const entries = await view((actor) => listDecided(actor, 'released'));
  return (
    <main id="main" className="mx-auto max-w-desk px-4 py-6 sm:px-6">
      <h1 className="mb-5 font-display text-page">Released</h1>
      <DecidedList
        entries={entries}
        empty={{ title: 'None yet', text: 'When a checker releases a version, it stands here and on sale.' }}
      />
    </main>
  );
}
