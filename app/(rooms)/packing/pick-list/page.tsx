import type { Metadata } from 'next';
import { view } from '@/app/view';
import { PickListView } from '@/components/packing/pick-list-view';
import { readPickList } from '@/services/packing';

export const metadata: Metadata = { title: 'Pick list' };

interface Props {
  searchParams: Promise<{ boxes?: string | string[] }>;
}

export default async function PickListPage({ searchParams }: Props) {
  const asked = Number((await searchParams).boxes);
  const boxes = Number.isInteger(asked) && asked > 0 ? asked : undefined;
  const list = await view((actor) => readPickList(actor, boxes === undefined ? {} : { boxes }));
  return (
    <main id="main" className="px-4 py-6 sm:px-7">
      <PickListView list={list} />
    </main>
  );
}
