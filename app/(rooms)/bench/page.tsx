import type { Metadata } from 'next';
import { view } from '@/app/view';
import { BenchKits } from '@/components/bench/bench-kits';
import { LinkButton } from '@/components/ui/link-button';
import { can } from '@/services/access';
import { listVersions } from '@/services/kits';

interface Props {
  searchParams: Promise<{ show?: string }>;
}

export async function generateMetadata({ searchParams }: Props): Promise<Metadata> {
  const { show } = await searchParams;
  return { title: show === 'mine' ? 'My versions, bench' : 'Kits, bench' };
}

export default async function BenchPage({ searchParams }: Props) {
  const { show } = await searchParams;
  const { kits, mayCreate } = await view(async (actor) => ({
    kits: await listVersions(actor),
    mayCreate: can(actor, 'kit.create'),
  }));
  return (
    <main id="main" className="mx-auto max-w-desk px-4 py-6 sm:px-6">
      <div className="mb-5 flex flex-wrap items-center gap-4">
        <h1 className="font-display text-page">Kits</h1>
        {mayCreate && (
          <LinkButton href="/bench/kits/new" icon="plus" className="ml-auto">
            Start a kit
          </LinkButton>
        )}
      </div>
      <BenchKits kits={kits} onlyMine={show === 'mine'} mayCreate={mayCreate} />
    </main>
  );
}
