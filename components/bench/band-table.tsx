import { Table } from '@/components/ui/table';
import { grouped } from '@/services/quantity';
import { bandChoices } from './band-choice';

interface KitOfBand {
  number: number;
  name: string;
  band: { code: string; lo: number; hi: number };
}

const kHz = (hertz: number) => String(hertz / 1000);

export function BandTable({ kits }: { kits: readonly KitOfBand[] }) {
  return (
    <Table
      caption="Broadcast bands"
      rows={bandChoices}
      rowKey={({ id }) => id}
      columns={[
        { key: 'name', head: 'Band', isRowHead: true, cell: ({ label }) => label },
        { key: 'lo', head: 'From, kHz', figures: true, cell: ({ band }) => kHz(band.lo) },
        { key: 'hi', head: 'To, kHz', figures: true, cell: ({ band }) => kHz(band.hi) },
        {
          key: 'carriers',
          head: 'Carriers',
          figures: true,
          cell: ({ band }) => grouped(Math.round((band.lastCarrier - band.firstCarrier) / band.step) + 1),
        },
        { key: 'step', head: 'Every, kHz', figures: true, cell: ({ band }) => kHz(band.step) },
        { key: 'ratio', head: 'Span', figures: true, cell: ({ band }) => `${(band.hi / band.lo).toFixed(2)} to 1` },
        {
          key: 'kits',
          head: 'Kits made for it',
          cell: ({ band }) =>
            kits
              .filter((kit) => kit.band.lo === band.lo && kit.band.hi === band.hi)
              .map(({ number, name }) => `No. ${number} ${name}`)
              .join(', ') || 'none',
        },
      ]}
    />
  );
}
