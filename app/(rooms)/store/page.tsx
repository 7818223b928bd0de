import type { Metadata } from 'next';
import { view } from '@/app/view';
import { PartStock } from '@/components/store/part-stock';
import { StoreSearch } from '@/components/store/store-search';
import { Empty } from '@/components/ui/empty';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { can } from '@/services/access';
import { currentActor } from '@/services/people';
import { readStore } from '@/services/stock';
import { isFound } from '@/services/stock/rules';
import { accept, block } from './actions';

interface Props {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

const searched = async ({ searchParams }: Props): Promise<string> => {
  const asked = (await searchParams)['q'];
  return typeof asked === 'string' ? asked.trim().slice(0, 80) : '';
};

export async function generateMetadata(props: Props): Promise<Metadata> {
  const q = await searched(props);
  return { title: q === '' ? 'Store' : `‘${q}’, store` };
}

export default async function StorePage(props: Props) {
  const q = await searched(props);
  const { parts } = await view(readStore);
  const actor = await currentActor();
  const found = parts.filter((part) => isFound(part, q));
  const waiting = parts.flatMap((part) => part.lots).filter((lot) => lot.state === 'quarantine' && lot.onHand > 0);
  return (
    <main id="main" className="mx-auto max-w-desk px-4 py-6 sm:px-6">
      <div className="mb-4 flex flex-wrap items-end justify-between gap-x-6 gap-y-4">
        <h1 className="font-display text-page">On hand</h1>
        {can(actor, 'stock.receive') && (
          <LinkButton href="/store/receive" variant="primary" size="floor" icon="download">
            Receive a lot
          </LinkButton>
        )}
      </div>
      <StoreSearch q={q} />
      {waiting.length > 0 && (
        <Notice
          kind="note"
          size="floor"
          className="mt-4"
          title={`${waiting.length} ${waiting.length === 1 ? 'lot waits' : 'lots wait'} to be inspected`}
        >
          {waiting.map((lot) => lot.code).join(', ')}. Nothing of {waiting.length === 1 ? 'it' : 'them'} can be promised
          before that.
        </Notice>
      )}
      {found.length === 0 ? (
        <div className="mt-6">
          <Empty title={q === '' ? 'The store is empty' : `No part, lot or bin matches ‘${q}’`}>
            {q === ''
              ? 'When a part is added to the list and its first lot received, it stands here.'
              : 'Look by a part’s code or name, by a lot’s code, or by a bin, such as C-14.'}
          </Empty>
        </div>
      ) : (
        <ul className="mt-4 border-t-2 border-ink">
          {found.map((part) => (
            <PartStock
              key={part.id}
              part={part}
              onAccept={can(actor, 'stock.receive') ? accept : null}
              onUnblock={can(actor, 'stock.block') ? accept : null}
              onBlock={can(actor, 'stock.block') ? block : null}
            />
          ))}
        </ul>
      )}
    </main>
  );
}
