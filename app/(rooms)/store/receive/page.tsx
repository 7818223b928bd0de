import type { Metadata } from 'next';
import { view } from '@/app/view';
import { ReceiveForm } from '@/components/store/receive-form';
import { readReceiving } from '@/services/stock';
import { receive } from '../actions';

export const metadata: Metadata = { title: 'Receive a lot' };

export default async function ReceivePage() {
  const parts = await view(readReceiving);
  return (
    <main id="main" className="mx-auto max-w-desk px-4 py-6 sm:px-6">
      <h1 className="mb-5 font-display text-page">Receive a lot</h1>
      <ReceiveForm parts={parts} onReceive={receive} />
    </main>
  );
}
