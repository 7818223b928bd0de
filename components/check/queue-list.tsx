'use client';

import Link from 'next/link';
import { useRouter } from 'next/navigation';
import { ReachRail } from '@/components/charts/reach-rail';
import { Plate } from '@/components/devices/plate';
import { WindingMark } from '@/components/devices/winding-mark';
import { Select } from '@/components/ui/select';
import { shortWords } from '@/templates/drawings/reach-sentence';
import type { Queue, QueueEntry } from '@/services/check/schemas';
import { showDay } from '@/services/time';

export interface QueueListProps {
  queue: Queue;
  /** The version whose sheet is open. */
  current: string | null;
}

/** The queue is the navigation of the room: oldest first, each with its rail. On phones a drop list. */
export function QueueList({ queue, current }: QueueListProps) {
  const router = useRouter();
  const all = [...queue.waiting, ...queue.held];
  return (
    <>
      <div className="border-b border-rule p-4 md:hidden">
        <Select
          label="Version on the table"
          value={all.some(({ versionId }) => versionId === current) ? (current ?? '') : ''}
          placeholder="Choose a version"
          onChange={(event) => event.target.value !== '' && router.push(`/check/${event.target.value}`)}
          options={[
            { group: 'In check, oldest first', options: queue.waiting.map(optionOf) },
            { group: 'Held', options: queue.held.map(optionOf) },
          ]}
        />
      </div>
      <nav aria-label="Queue" className="hidden border-r border-rule bg-paper md:block">
        <h2 className="px-4.5 pt-4 pb-3 text-caption font-semibold text-ink2">In check, oldest first</h2>
        {queue.waiting.length === 0 && <p className="border-t border-rule px-4.5 py-3 text-caption">Nothing waits.</p>}
        <ul>
          {queue.waiting.map((entry) => (
            <QueueRow key={entry.versionId} entry={entry} isCurrent={entry.versionId === current} />
          ))}
        </ul>
        {queue.held.length > 0 && (
          <>
            <h2 className="border-t border-rule px-4.5 pt-4 pb-3 text-caption font-semibold text-ink2">Held</h2>
            <ul>
              {queue.held.map((entry) => (
                <QueueRow key={entry.versionId} entry={entry} isCurrent={entry.versionId === current} />
              ))}
            </ul>
          </>
        )}
      </nav>
    </>
  );
}

const optionOf = ({ versionId, kitName, kitNumber, letter }: QueueEntry) => ({
  value: versionId,
  label: `${kitNumber} ${letter} ${kitName}`,
});

function QueueRow({ entry, isCurrent }: { entry: QueueEntry; isCurrent: boolean }) {
  const { versionId, kitNumber, kitName, letter, state, band, reach, sentAt, own } = entry;
  const view = { band, nominal: reach?.nominal ?? null, worst: reach?.corners ?? null };
  return (
    <li
      className={`relative border-t border-rule px-4.5 py-3 ${isCurrent ? 'bg-card shadow-[inset_6px_0_0_var(--enamel)]' : 'hover:bg-card'}`}
    >
      <Link
        href={`/check/${versionId}`}
        {...(isCurrent && { 'aria-current': 'page' as const })}
        className="flex items-center gap-3 before:absolute before:inset-0"
      >
        <Plate kit={kitNumber} size="row" />
        <b className="min-w-0 flex-1 truncate text-value">{kitName}</b>
        <span className="font-figures font-semibold">{`${kitNumber} ${letter}`}</span>
      </Link>
      <ReachRail size="list" {...view} className="my-2" />
      <div className="flex items-center justify-between gap-2">
        <WindingMark state={state} />
        <span className="text-right text-caption text-ink2">
          {state === 'held' ? shortOf(view) : own ? 'your own work' : `sent ${showDay(sentAt)}`}
        </span>
      </div>
    </li>
  );
}

/** "short by 16 kHz" where the reach is the cause; nothing where another rule is. */
function shortOf(view: Parameters<typeof shortWords>[0]): string {
  const words = shortWords(view);
  return words.startsWith('Short by') ? words.replace(/^Short by (\d+) kHz.*$/, 'short by $1 kHz') : '';
}
