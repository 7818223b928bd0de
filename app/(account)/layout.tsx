import Link from 'next/link';
import type { ReactNode } from 'react';
import { Wordmark } from '@/components/devices/wordmark';
import { PersonMenu } from '@/components/shell/person-menu';
import { SkipLink } from '@/components/shell/skip-link';
import { currentActor } from '@/services/people';

/** Coming in, and one's own data: light, with nothing around it that leads astray. */
export default async function AccountLayout({ children }: { children: ReactNode }) {
  const actor = await currentActor();
  return (
    <div data-theme="light" className="min-h-dvh">
      <SkipLink />
      <header className="mx-auto flex min-h-18 max-w-page items-center justify-between gap-6 px-4 sm:px-6">
        <Link href="/">
          <Wordmark />
        </Link>
        {actor.kind !== 'visitor' && <PersonMenu actor={actor} />}
      </header>
      <main id="main" className="mx-auto max-w-page px-4 pt-6 pb-16 sm:px-6">
        {children}
      </main>
    </div>
  );
}
