import type { Metadata } from 'next';
import { view } from '@/app/view';
import { TrayScreen } from '@/components/packing/tray-screen';
import { can } from '@/services/access';
import { readBox } from '@/services/packing';
import { claimBox, closeBox, markPrinted, putBack, scan, tellEmpty, weigh } from '../actions';

export const metadata: Metadata = { title: 'Tray' };

export default async function BoxPage({ params }: { params: Promise<{ boxId: string }> }) {
  const { boxId } = await params;
  const { box, mayPack } = await view(async (actor) => ({
    box: await readBox(actor, boxId),
    mayPack: can(actor, 'box.pack'),
  }));
  return (
    <TrayScreen
      initial={box}
      mayPack={mayPack}
      deeds={{ claimBox, closeBox, markPrinted, putBack, scan, tellEmpty, weigh }}
    />
  );
}
