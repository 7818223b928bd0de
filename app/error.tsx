'use client';

import { PlainPage } from '@/components/shell/plain-page';
import { Button } from '@/components/ui/button';
import { LinkButton } from '@/components/ui/link-button';

/** A crash: what was written is safe, since every change is whole or not at all. */
export default function Crash({ error, reset }: { error: Error & { digest?: string }; reset: () => void }) {
  return (
    <PlainPage title="Something broke on our side" drawing="tool">
      <p>Nothing you saved is lost. Try again; if it breaks again, tell us the number below and what you were doing.</p>
      {error.digest && (
        <p>
          Number of this fault: <b className="font-figures">{error.digest}</b>
        </p>
      )}
      <p className="flex flex-wrap gap-3">
        <Button variant="primary" onClick={reset}>
          Try again
        </Button>
        <LinkButton href="/">To the shop</LinkButton>
      </p>
    </PlainPage>
  );
}
