import type { Metadata } from 'next';
import { view } from '@/app/view';
import { DecidedList } from '@/components/check/decided-list';
import { listDecided } from '@/services/check';

export const metadata: Metadata = { title: 'Held versions' };

export default async function HeldPage() {
  const entries = await view((actor) => listDecided(actor, 'held'));
  return (
    <main id="main" className="mx-auto max-w-desk px-4 py-6 sm:px-6">
      <h1 className="mb-5 font-display text-page">Held</h1>
      <DecidedList
        entries={entries}
        empty={{
          title: 'None yet',
          text: 'When a checker holds a version, it stands here until a new one answers it.',
        }}
      />
    </main>
  );
}
