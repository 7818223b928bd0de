'use client';

/** The last net, for a fault in the root layout itself: no fonts, no components, only words. */
export default function GlobalCrash({ reset }: { error: Error; reset: () => void }) {
  return (
    <html lang="en">
      <body>
        <main>
          <h1>Something broke on our side</h1>
          <p>Nothing you saved is lost. Try again in a moment.</p>
          <button type="button" onClick={reset}>
            Try again
          </button>
        </main>
      </body>
    </html>
  );
}
