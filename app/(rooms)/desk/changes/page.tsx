import type { Metadata } from 'next';
import { view } from '@/app/view';
import { ChangeTable } from '@/components/account/change-table';
import { TextLink } from '@/components/ui/link-button';
import { Paging } from '@/components/ui/paging';
import { listChanges } from '@/services/people';

export const metadata: Metadata = { title: 'Record of changes' };

type Search = Promise<Record<string, string | string[] | undefined>>;

export default async function ChangesPage({ searchParams }: { searchParams: Search }) {
  const { before, kind, id } = await searchParams;
  const subject = typeof kind === 'string' && typeof id === 'string' ? { kind, id } : null;
  const { changes, older } = await view((actor) =>
    listChanges(actor, {
      ...(typeof before === 'string' && /^\d{1,15}$/.test(before) && { before: Number(before) }),
      ...(subject && { subjectKind: subject.kind, subjectId: subject.id }),
    }),
  );
  const address = (query: Record<string, string>) =>
    `/desk/changes?${new URLSearchParams({ ...(subject && { kind: subject.kind, id: subject.id }), ...query }).toString()}`;
  return (
    <main id="main" className="mx-auto max-w-desk px-4 py-8 sm:px-6">
      <h1 className="font-display text-page">Record of changes</h1>
      <p className="mt-2 max-w-measure">
        Every change with who, when, before and after. Lines are added, never changed; each carries a seal of the one
        before it.
      </p>
      {subject && (
        <p className="mt-4 flex flex-wrap gap-x-4">
          <span>
            Only {subject.kind} <span className="font-figures">{subject.id.slice(0, 8)}</span>.
          </span>
          <TextLink href="/desk/changes">Show everything</TextLink>
        </p>
      )}
      <div className="mt-6">
        <ChangeTable changes={changes} />
        <Paging
          olderHref={older === null ? undefined : address({ before: String(older) })}
          newerHref={before === undefined ? undefined : address({})}
          words={['Newest', 'Older']}
        />
      </div>
    </main>
  );
}
