import { Disclosure } from '@/components/ui/disclosure';
import { Table } from '@/components/ui/table';
import {
  pinFit,
  shortfall,
  shownDifference,
  shownKHz,
  type ReachView,
  type Span,
} from '@/templates/drawings/reach-axis';
import { pinWords } from '@/templates/drawings/reach-sentence';

type Row = { what: string; from: string; to: string; remark: string };

/** The rail's twin: the same figures and each station, behind "Show as table". */
export function ReachTable({
  name = 'Reach',
  isOpen = false,
  ...view
}: ReachView & { name?: string; isOpen?: boolean }) {
  const short = shortfall(view);
  const missing = [short.low, short.high]
    .filter((hertz) => hertz > 0)
    .map((hertz) => `short by ${shownDifference(hertz)} kHz`);
  const rows: Row[] = [
    row('Band', view.band, ''),
    row('Nominal', view.nominal, view.nominal ? '' : 'tunes nothing'),
    row('Worst case', view.worst, view.worst ? missing.join(', ') || 'covers the band' : 'not worked out yet'),
    ...(view.stations ?? []).map((station) => ({
      what: station.name,
      from: shownKHz(station.f),
      to: '',
      remark: pinWords[pinFit(view, station.f)],
    })),
  ];
  return (
    <Disclosure summary="Show as table" of={`of ${name.toLowerCase()}`} isOpen={isOpen}>
      <Table
        caption={`${name}, in kilohertz`}
        density="tight"
        columns={[
          { key: 'what', head: 'What', isRowHead: true, cell: (line: Row) => line.what },
          { key: 'from', head: 'From, kHz', figures: true, cell: (line: Row) => line.from },
          { key: 'to', head: 'To, kHz', figures: true, cell: (line: Row) => line.to },
          { key: 'remark', head: 'Remark', cell: (line: Row) => line.remark },
        ]}
        rows={rows}
        rowKey={(line) => `${line.what} ${line.from}`}
      />
    </Disclosure>
  );
}

function row(what: string, span: Span | null, remark: string): Row {
  return { what, from: span ? shownKHz(span.lo) : '', to: span ? shownKHz(span.hi) : '', remark };
}
