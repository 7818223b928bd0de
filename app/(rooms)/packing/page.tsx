import type { Metadata } from 'next';
import { view } from '@/app/view';
import { BoxLists } from '@/components/packing/box-lists';
import { can } from '@/services/access';
import { listBoxes } from '@/services/packing';
import { claimBox } from './actions';

export const metadata: Metadata = { title: 'Boxes' };

/** What to do next: my boxes in hand, then the oldest paid ones. */
export default async function BoxesPage() {
  const { lists, mayPack } = await view(async (actor) => ({
    lists: await listBoxes(actor),
    mayPack: can(actor, 'box.pack'),
  }));
  return (
    <main id="main" className="grid gap-8 px-4 py-6 sm:px-7">
      <BoxLists lists={lists} mayPack={mayPack} onClaim={claimBox} />
    </main>
  );
}
