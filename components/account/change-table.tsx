import { Disclosure } from '@/components/ui/disclosure';
import { Empty } from '@/components/ui/empty';
import { TextLink } from '@/components/ui/link-button';
import { Table } from '@/components/ui/table';
import type { ChangeView } from '@/services/people/schemas';
import { showMoment } from '@/services/time';

export function ChangeTable({ changes }: { changes: readonly ChangeView[] }) {
  return (
    <Table
      caption="Record of changes, newest first"
      rows={changes}
      rowKey={(change) => String(change.seq)}
      empty={<Empty title="Nothing was changed yet">The first change of anybody stands here.</Empty>}
      columns={[
        { key: 'seq', head: 'Line', figures: true, cell: (change) => change.seq },
        { key: 'at', head: 'When', cell: (change) => showMoment(change.at) },
        { key: 'who', head: 'Who', cell: (change) => whoWords[change.who] ?? change.who },
        { key: 'what', head: 'What', isRowHead: true, cell: (change) => inWords(change.action) },
        { key: 'subject', head: 'Of', cell: subjectOf },
        { key: 'more', head: 'Before and after', cell: (change) => <BeforeAfter change={change} /> },
      ]}
    />
  );
}

/** Who is not a person, in words. */
const whoWords: Readonly<Record<string, string>> = {
  visitor: 'a guest',
  stripe: 'payment provider',
  worker: 'the worker',
  command: 'a command',
};

/** "version.sent-to-check" reads "version sent to check". */
const inWords = (action: string) => action.replace(/[.-]/g, ' ');

const subjectOf = ({ subject }: ChangeView) => (
  <TextLink href={`/desk/changes?${new URLSearchParams(subject).toString()}`}>
    {subject.kind} <span className="font-figures">{subject.id.slice(0, 8)}</span>
  </TextLink>
);

function BeforeAfter({ change }: { change: ChangeView }) {
  const rows = [
    ['Before', change.before],
    ['After', change.after],
    ['Reason', change.reason],
    ['Seal', change.hash],
  ].flatMap(([name, text]) => (name && text ? [{ name, text }] : []));
  return (
    <Disclosure summary="Show">
      <dl className="grid max-w-measure grid-cols-[auto_1fr] gap-x-4 gap-y-1 text-left text-caption">
        {rows.map(({ name, text }) => (
          <div key={name} className="contents">
            <dt className="text-ink2">{name}</dt>
            <dd className="font-figures break-all whitespace-pre-wrap">{text}</dd>
          </div>
        ))}
      </dl>
    </Disclosure>
  );
}
