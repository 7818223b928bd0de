import type { Metadata } from 'next';
import { cache } from 'react';
import { view } from '@/app/view';
import { QueueList } from '@/components/check/queue-list';
import { CheckSheet } from '@/components/check/sheet';
import { can } from '@/services/access';
import { readQueue, readSheet } from '@/services/check';
import { hold, release, withdraw } from '../actions';

interface Props {
  params: Promise<{ versionId: string }>;
}

/** Once a request, for the title and the page. */
const load = cache((versionId: string) =>
  view(async (actor) => ({
    sheet: await readSheet(actor, versionId),
    queue: can(actor, 'version.check') ? await readQueue(actor) : { waiting: [], held: [] },
    mayWithdraw: can(actor, 'version.withdraw'),
  })),
);

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { sheet } = await load((await params).versionId);
  const { kit } = sheet.content;
  return { title: `${kit.name} ${kit.number} ${sheet.letter}, check sheet` };
}

export default async function SheetPage({ params }: Props) {
  const { sheet, queue, mayWithdraw } = await load((await params).versionId);
  return (
    <main id="main" className="md:grid md:min-h-[calc(100dvh-60px)] md:grid-cols-[284px_minmax(0,1fr)]">
      <QueueList queue={queue} current={sheet.versionId} />
      <CheckSheet
        key={`${sheet.versionId} ${sheet.state}`}
        sheet={sheet}
        mayWithdraw={mayWithdraw}
        hold={hold}
        release={release}
        withdraw={withdraw}
      />
    </main>
  );
}
