import type { Metadata } from 'next';
import { view } from '@/app/view';
import { NewKitForm } from '@/components/bench/new-kit-form';
import { must } from '@/services/access';
import { listKits } from '@/services/kits';
import { createKit } from '../../actions';

export const metadata: Metadata = { title: 'Start a kit' };

export default async function NewKitPage() {
  const kits = await view(async (actor) => {
    must(actor, 'kit.create');
    return listKits(actor);
  });
  return (
    <main id="main" className="mx-auto max-w-desk px-4 py-6 sm:px-6">
      <h1 className="mb-5 font-display text-page">Start a kit</h1>
      <NewKitForm nextNumber={1 + Math.max(0, ...kits.map(({ number }) => number))} createKit={createKit} />
    </main>
  );
}
