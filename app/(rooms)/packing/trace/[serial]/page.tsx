import type { Metadata } from 'next';
import { view } from '@/app/view';
import { BoxTraceView } from '@/components/packing/box-trace-view';
import { TraceSearch } from '@/components/packing/trace-search';
import { traceBox } from '@/services/packing';

export const metadata: Metadata = { title: 'Trace of a box' };

export default async function BoxTracePage({ params }: { params: Promise<{ serial: string }> }) {
  const { serial } = await params;
  const trace = await view((actor) => traceBox(actor, serial));
  return (
    <main id="main" className="grid gap-8 px-4 py-6 sm:px-7">
      <TraceSearch code={trace.serial} problem="" />
      <BoxTraceView trace={trace} />
    </main>
  );
}
