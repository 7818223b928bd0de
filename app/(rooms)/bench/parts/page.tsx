import type { Metadata } from 'next';
import { view } from '@/app/view';
import { PartTable } from '@/components/bench/part-table';
import { LinkButton } from '@/components/ui/link-button';
import { can } from '@/services/access';
import { listParts } from '@/services/parts';
import { PART_KINDS } from '@/services/parts/schemas';

interface Props {
  searchParams: Promise<{ q?: string; kind?: string; after?: string; retired?: string }>;
}

export async function generateMetadata({ searchParams }: Props): Promise<Metadata> {
  const { q = '' } = await searchParams;
  return { title: q === '' ? 'Parts' : `‘${q.slice(0, 80)}’, parts` };
}

export default async function PartsPage({ searchParams }: Props) {
  const { q = '', kind, after, retired } = await searchParams;
  const known = PART_KINDS.find((one) => one === kind);
  const { page, mayEdit } = await view(async (actor) => ({
    page: await listParts(actor, {
      q: q.slice(0, 80),
      ...(known && { kind: known }),
      ...(after !== undefined && { after: after.slice(0, 20) }),
      retired: retired === '1',
    }),
    mayEdit: can(actor, 'part.edit'),
  }));
  return (
    <main id="main" className="mx-auto max-w-desk px-4 py-6 sm:px-6">
      <div className="mb-5 flex flex-wrap items-center gap-4">
        <h1 className="font-display text-page">Parts</h1>
        {mayEdit && (
          <LinkButton href="/bench/parts/new" icon="plus" className="ml-auto">
            Add a part
          </LinkButton>
        )}
      </div>
      <PartTable page={page} search={{ q, kind: known ?? '', after: after ?? '', retired: retired === '1' }} />
    </main>
  );
}
