import type { Metadata } from 'next';
import { cache } from 'react';
import { view } from '@/app/view';
import { BoxTraceView } from '@/components/packing/box-trace-view';
import { TraceSearch } from '@/components/packing/trace-search';
import { traceBox } from '@/services/packing';

interface Props {
  params: Promise<{ serial: string }>;
}

/** Once a request, for the title and the page. */
const load = cache((serial: string) => view((actor) => traceBox(actor, serial)));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const trace = await load((await params).serial);
  return { title: `${trace.serial}, trace` };
}

export default async function BoxTracePage({ params }: Props) {
  const trace = await load((await params).serial);
  return (
    <main id="main" className="grid gap-8 px-4 py-6 sm:px-7">
      <TraceSearch code={trace.serial} problem="" />
      <BoxTraceView trace={trace} />
    </main>
  );
}
