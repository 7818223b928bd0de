import type { Metadata } from 'next';
import { view } from '@/app/view';
import { BandTable } from '@/components/bench/band-table';
import { listKits } from '@/services/kits';

export const metadata: Metadata = { title: 'Bands' };

export default async function BandsPage() {
  const kits = await view(listKits);
  return (
    <main id="main" className="mx-auto max-w-desk px-4 py-6 sm:px-6">
      <h1 className="font-display text-page">Bands</h1>
      <p className="mt-2 mb-6 max-w-measure text-ink2">
        The broadcast bands a kit can be made for, with the carriers that every box has to tune. Margins are measured at
        the edges.
      </p>
      <BandTable kits={kits} />
    </main>
  );
}
