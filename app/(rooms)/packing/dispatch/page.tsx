import type { Metadata } from 'next';
import { view } from '@/app/view';
import { DispatchList } from '@/components/packing/dispatch-list';
import { can } from '@/services/access';
import { readDispatch } from '@/services/packing';
import { ship } from '../actions';

export const metadata: Metadata = { title: 'Dispatch' };

export default async function DispatchPage() {
  const { dispatch, mayShip } = await view(async (actor) => ({
    dispatch: await readDispatch(actor),
    mayShip: can(actor, 'order.ship'),
  }));
  return (
    <main id="main" className="px-4 py-6 sm:px-7">
      <DispatchList dispatch={dispatch} mayShip={mayShip} onShip={ship} />
    </main>
  );
}
