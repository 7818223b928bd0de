'use client';

import { faces } from '@/components/fonts';
import './globals.css';

/** The last net, for a fault in the root layout itself: no components, only words in the yard's own faces. */
export default function GlobalCrash({ reset }: { error: Error; reset: () => void }) {
  return (
    <html lang="en" className={faces}>
      <body>
        <title>Something broke: Coilyard</title>
        <main data-theme="light" className="mx-auto max-w-page px-4 py-16 sm:px-6">
          <h1 className="font-display text-page">Something broke on our side</h1>
          <p className="mt-4 mb-5 text-lead">Nothing you saved is lost. Try again in a moment.</p>
          <button
            type="button"
            onClick={reset}
            className="min-h-target rounded-control bg-plate px-5 font-bold text-on-enamel shadow-lip"
          >
            Try again
          </button>
        </main>
      </body>
    </html>
  );
}
