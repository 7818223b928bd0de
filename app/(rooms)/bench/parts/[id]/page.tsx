import type { Metadata } from 'next';
import { cache } from 'react';
import { view } from '@/app/view';
import { PartForm } from '@/components/bench/part-form';
import { PartSheet } from '@/components/bench/part-sheet';
import { PartUse } from '@/components/bench/part-use';
import { RetirePart } from '@/components/bench/retire-part';
import { Breadcrumbs } from '@/components/ui/breadcrumbs';
import { can } from '@/services/access';
import { readPart, readUse } from '@/services/parts';
import { changePart, retirePart } from '../../actions';

interface Props {
  params: Promise<{ id: string }>;
}

/** Once a request, for the title and the page. */
const load = cache((id: string) =>
  view(async (actor) => {
    const found = await readPart(actor, id);
    return { part: found, uses: await readUse(actor, found.id), mayEdit: can(actor, 'part.edit') };
  }),
);

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { part } = await load((await params).id);
  return { title: `${part.code}, part` };
}

export default async function PartPage({ params }: Props) {
  const { part, uses, mayEdit } = await load((await params).id);
  return (
    <main id="main" className="mx-auto max-w-desk px-4 py-6 sm:px-6">
      <Breadcrumbs trail={[{ label: 'Parts', href: '/bench/parts' }]} here={part.code} />
      <h1 className="mt-2 mb-5 font-display text-section">{part.name}</h1>
      <div className="grid gap-8 xl:grid-cols-[minmax(0,1fr)_22rem]">
        {mayEdit ? <PartForm key={part.id} part={part} changePart={changePart} /> : <PartSheet part={part} />}
        <div className="grid content-start gap-6">
          {mayEdit && <PartSheet part={part} />}
          <PartUse uses={uses} />
          {mayEdit && <RetirePart part={part} retirePart={retirePart} />}
        </div>
      </div>
    </main>
  );
}
