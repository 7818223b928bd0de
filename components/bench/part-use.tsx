import Link from 'next/link';
import { WindingMark } from '@/components/devices/winding-mark';
import { Panel } from '@/components/ui/panel';
import { VersionState } from '@/services/kits/schemas';

export interface PartUseRow {
  versionId: string;
  kitName: string;
  kitNumber: number;
  letter: string;
  state: string;
  references: readonly string[];
}

/** Where the part is used: every version with it on a line. */
export function PartUse({ uses }: { uses: readonly PartUseRow[] }) {
  return (
    <Panel title="Where it is used" ground="open">
      {uses.length === 0 && <p>No version uses it.</p>}
      <ul>
        {uses.map(({ versionId, kitName, kitNumber, letter, state, references }) => (
          <li
            key={versionId}
            className="relative flex min-h-target flex-wrap items-center gap-3 border-b border-rule py-1.5"
          >
            <Link href={`/bench/${versionId}`} className="font-semibold before:absolute before:inset-0">
              <span className="font-figures">{`${kitNumber} ${letter}`}</span> {kitName}
            </Link>
            <span className="text-caption text-ink2">{references.join(', ')}</span>
            <span className="ml-auto">
              <WindingMark state={VersionState.parse(state)} />
            </span>
          </li>
        ))}
      </ul>
    </Panel>
  );
}
