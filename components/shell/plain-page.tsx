import Link from 'next/link';
import type { ReactNode } from 'react';
import { Wordmark } from '@/components/devices/wordmark';
import { SvgDrawing } from '@/templates/drawings/as-svg';
import { type PartFamily, partDrawing } from '@/templates/drawings/part-drawing';

/** A page that stands alone: what happened, what it means, what to do next. */
export function PlainPage({ title, drawing, children }: { title: string; drawing: PartFamily; children: ReactNode }) {
  return (
    <div data-theme="light" className="min-h-dvh">
      <header className="mx-auto max-w-page px-4 py-5 sm:px-6">
        <Link href="/" className="inline-block">
          <Wordmark />
        </Link>
      </header>
      <main id="main" className="mx-auto max-w-page px-4 pt-8 pb-16 sm:px-6">
        <div className="grid items-start gap-x-12 gap-y-6 md:grid-cols-[minmax(0,1fr)_auto]">
          <div>
            <h1 className="font-display text-page">{title}</h1>
            <div className="mt-4 max-w-measure space-y-4 text-lead">{children}</div>
          </div>
          <div className="rounded-panel border border-rule bg-well px-8 py-6 max-md:order-first max-md:justify-self-start">
            <SvgDrawing drawing={partDrawing(drawing)} steadyLines className="block h-auto w-24 md:w-72" />
          </div>
        </div>
      </main>
    </div>
  );
}
