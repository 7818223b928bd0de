import type { Metadata } from 'next';
import { view } from '@/app/view';
import { QueueList } from '@/components/check/queue-list';
import { CheckSheet } from '@/components/check/sheet';
import { can } from '@/services/access';
import { readQueue, readSheet } from '@/services/check';
import { hold, release, withdraw } from '../actions';

export const metadata: Metadata = { title: 'Check sheet' };

export default async function SheetPage({ params }: { params: Promise<{ versionId: string }> }) {
  const { versionId } = await params;
  const { sheet, queue, mayWithdraw } = await view(async (actor) => ({
    sheet: await readSheet(actor, versionId),
    queue: can(actor, 'version.check') ? await readQueue(actor) : { waiting: [], held: [] },
    mayWithdraw: can(actor, 'version.withdraw'),
  }));
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
