import Link from 'next/link';
import { ReachRail } from '@/components/charts/reach-rail';
import { Plate } from '@/components/devices/plate';
import { WindingMark } from '@/components/devices/winding-mark';
import { Empty } from '@/components/ui/empty';
import { Sign } from '@/components/ui/sign';
import { TabLinks } from '@/components/ui/tab-links';
import { SvgDrawing } from '@/templates/drawings/as-svg';
import { partDrawing } from '@/templates/drawings/part-drawing';
import type { VersionState } from '@/services/kits/schemas';
import { showDay } from '@/services/time';

/** What the list needs of a version; the bench's read gives more. */
export interface KitRow {
  kitId: string;
  number: number;
  name: string;
  band: { lo: number; hi: number };
  versions: readonly VersionRow[];
}

interface VersionRow {
  id: string;
  letter: string;
  state: VersionState;
  updatedAt: number;
  sentAt: number | null;
  mine: boolean;
  editors: readonly string[];
  summary: { reach: { nominal: Span; corners: Span }; stops: readonly string[] } | null;
  lacks: string | null;
}
interface Span {
  lo: number;
  hi: number;
}

export function BenchKits({
  kits,
  onlyMine,
  mayCreate,
}: {
  kits: readonly KitRow[];
  onlyMine: boolean;
  mayCreate: boolean;
}) {
  const shown = kits
    .map((kit) => ({ ...kit, versions: kit.versions.filter((version) => !onlyMine || version.mine) }))
    .filter((kit) => kit.versions.length > 0);
  return (
    <>
      <TabLinks
        look="bar"
        label="Which versions"
        className="mb-6"
        links={[
          { href: '/bench', label: 'All versions', isCurrent: !onlyMine },
          { href: '/bench?show=mine', label: 'My versions', isCurrent: onlyMine },
        ]}
      />
      {shown.length === 0 && (
        <Empty
          drawing={<SvgDrawing drawing={partDrawing('coil-tube')} width={90} />}
          title={onlyMine ? 'No version of yours yet' : 'No kit yet'}
        >
          {onlyMine
            ? 'A version is yours once you have changed a line of it.'
            : mayCreate
              ? 'Start a kit: give it a name and the band it has to tune, then choose its parts.'
              : 'When a designer starts a kit, it lands here with its versions.'}
        </Empty>
      )}
      <ul className="grid gap-8">
        {shown.map((kit) => (
          <li key={kit.kitId}>
            <section aria-labelledby={`kit-${kit.kitId}`} className="border-t-2 border-ink pt-3">
              <h2 id={`kit-${kit.kitId}`} className="mb-1 flex items-center gap-4 font-display text-panel">
                <Plate kit={kit.number} size="row" />
                {kit.name}
              </h2>
              <ul>
                {kit.versions.map((version) => (
                  <VersionLine key={version.id} kit={kit} version={version} />
                ))}
              </ul>
            </section>
          </li>
        ))}
      </ul>
    </>
  );
}

/** One version: letter and state, its small rail, and the verdict in a sentence. */
function VersionLine({ kit, version }: { kit: KitRow; version: VersionRow }) {
  const { summary, lacks } = version;
  const verdict = verdictOf(version);
  return (
    <li className="relative grid items-center gap-x-6 gap-y-1 border-b border-rule py-3 hover:bg-card md:grid-cols-[11rem_minmax(9rem,20rem)_minmax(0,1fr)_auto]">
      <Link
        href={`/bench/${version.id}`}
        className="flex min-h-target items-center gap-3 before:absolute before:inset-0"
      >
        <span className="font-figures text-value font-semibold">{`${kit.number} ${version.letter}`}</span>
        <WindingMark state={version.state} />
      </Link>
      <ReachRail
        size="list"
        band={kit.band}
        nominal={summary?.reach.nominal ?? null}
        worst={summary?.reach.corners ?? null}
      />
      <p className="flex gap-2.5">
        <Sign kind={verdict.sign} size={18} className="mt-0.5 shrink-0" />
        <span>{lacks ?? verdict.text}</span>
      </p>
      <p className="text-caption text-ink2 md:text-right md:whitespace-nowrap">{whenWords(version)}</p>
    </li>
  );
}

function verdictOf({ summary }: VersionRow): { sign: 'clears' | 'stops' | 'waiting'; text: string } {
  if (!summary) return { sign: 'waiting', text: '' };
  const [first, ...more] = summary.stops;
  if (first === undefined) return { sign: 'clears', text: 'No rule stops it.' };
  return { sign: 'stops', text: more.length === 0 ? first : `${first} And ${more.length} more.` };
}

function whenWords({ state, sentAt, updatedAt, editors, mine }: VersionRow): string {
  const who = mine ? 'you' : (editors[0] ?? '');
  if (state === 'draft') return `${who}, ${showDay(updatedAt)}`;
  return sentAt === null ? who : `${who}, sent ${showDay(sentAt)}`;
}
