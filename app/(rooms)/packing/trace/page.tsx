import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { view } from '@/app/view';
import { LotTraceView } from '@/components/packing/lot-trace-view';
import { TraceSearch } from '@/components/packing/trace-search';
import { must } from '@/services/access';
import { traceLot } from '@/services/packing';
import { isSerial } from '@/services/packing/rules';
import { Problem } from '@/services/problem';

interface Props {
  searchParams: Promise<{ code?: string | string[] }>;
}

const searched = async ({ searchParams }: Props): Promise<string> => {
  const { code } = await searchParams;
  return typeof code === 'string' ? code.trim().toUpperCase() : '';
};

export async function generateMetadata(props: Props): Promise<Metadata> {
  const code = await searched(props);
  return { title: code === '' ? 'Trace' : `${code}, trace` };
}

/** One field for both ways: a box serial leads to its lots, a lot's label code to its boxes. */
export default async function TracePage(props: Props) {
  const code = await searched(props);
  if (isSerial(code)) redirect(`/packing/trace/${code}`);
  const found = await view(async (actor) => {
    must(actor, 'box.trace');
    if (code === '') return { lot: null, sentence: '' };
    try {
      return { lot: await traceLot(actor, code), sentence: '' };
    } catch (error) {
      if (!(error instanceof Problem) || error.kind !== 'missing') throw error;
      return { lot: null, sentence: `Neither a box nor a lot has the code ${code}. Read its label again.` };
    }
  });
  return (
    <main id="main" className="grid gap-8 px-4 py-6 sm:px-7">
      <TraceSearch code={code} problem={found.sentence} />
      {found.lot && <LotTraceView trace={found.lot} />}
      {code === '' && (
        <ul className="grid max-w-measure gap-2 border-t-2 border-ink pt-4">
          <li>A box leads to its version, to who signed it, and to every lot that went into it.</li>
          <li>A lot leads to every box it went into, and to who has that box now.</li>
        </ul>
      )}
    </main>
  );
}
