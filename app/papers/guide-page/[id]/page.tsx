import type { Metadata } from 'next';
import { view } from '@/app/view';
import { GuidePage } from '@/components/packing/guide-page';
import { readGuidePage } from '@/services/documents';

export const metadata: Metadata = { title: 'Build guide', robots: { index: false } };

interface Props {
  params: Promise<{ id: string }>;
  searchParams: Promise<{ key?: string | string[] }>;
}

/** The guide of a box as a page: the same words and figures as the PDF, with headings, tables and texts for drawings. */
export default async function GuidePageOfBox({ params, searchParams }: Props) {
  const { id } = await params;
  const { key } = await searchParams;
  const own = typeof key === 'string' ? key : undefined;
  const guide = await view((actor) => readGuidePage(actor, { boxId: id, key: own }));
  const pdf = `/papers/guide/${id}${own === undefined ? '' : `?key=${encodeURIComponent(own)}`}`;
  return (
    <div data-theme="light" className="min-h-dvh bg-paper text-ink">
      <GuidePage guide={guide} pdf={pdf} />
    </div>
  );
}
