import type { Metadata } from 'next';
import { view } from '@/app/view';
import { ToSend } from '@/components/desk/late-orders';
import { OnSaleTable } from '@/components/desk/on-sale';
import { Takings } from '@/components/desk/takings';
import { WaitingList } from '@/components/desk/waiting-list';
import { WeekFigures } from '@/components/desk/week-figures';
import { readToday } from '@/services/desk';

export const metadata: Metadata = { title: 'Today' };

export default async function DeskPage() {
  const today = await view(readToday);
  return (
    <main id="main">
      <WeekFigures today={today} />
      <div className="mx-auto grid max-w-desk items-start gap-x-10 gap-y-8 px-4 py-6 sm:px-6 lg:grid-cols-[minmax(0,0.75fr)_minmax(0,1fr)]">
        <Takings today={today} />
        <WaitingList waiting={today.waiting} />
        <ToSend today={today} />
        <OnSaleTable kits={today.onSale} />
      </div>
    </main>
  );
}
