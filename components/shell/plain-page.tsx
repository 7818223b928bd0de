import Link from 'next/link';
import type { ReactNode } from 'react';
import { Wordmark } from '@/components/devices/wordmark';

/** A page that stands alone: what happened, what it means, what to do next. */
export function PlainPage({ title, children }: { title: string; children: ReactNode }) {
  return (
    <div data-theme="light" className="min-h-dvh">
      <header className="mx-auto max-w-page px-4 py-5 sm:px-6">
        <Link href="/" className="inline-block">
          <Wordmark />
        </Link>
      </header>
      <main id="main" className="mx-auto max-w-page px-4 pt-8 pb-16 sm:px-6">
        <h1 className="font-display text-page">{title}</h1>
        <div className="mt-4 max-w-measure space-y-4 text-lead">{children}</div>
      </main>
    </div>
  );
}
