import type { Metadata } from 'next';
import { cache } from 'react';
import { view } from '@/app/view';
import { TrayScreen } from '@/components/packing/tray-screen';
import { can } from '@/services/access';
import { readBox } from '@/services/packing';
import { claimBox, closeBox, markPrinted, putBack, scan, tellEmpty, weigh } from '../actions';

interface Props {
  params: Promise<{ boxId: string }>;
}

/** Once a request, for the title and the page. */
const load = cache((boxId: string) =>
  view(async (actor) => ({
    box: await readBox(actor, boxId),
    mayPack: can(actor, 'box.pack'),
  })),
);

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { box } = await load((await params).boxId);
  return { title: `${box.serial}, tray` };
}

export default async function BoxPage({ params }: Props) {
  const { box, mayPack } = await load((await params).boxId);
  return (
    <TrayScreen
      initial={box}
      mayPack={mayPack}
      deeds={{ claimBox, closeBox, markPrinted, putBack, scan, tellEmpty, weigh }}
    />
  );
}
