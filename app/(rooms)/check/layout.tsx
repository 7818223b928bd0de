import Link from 'next/link';
import type { ReactNode } from 'react';
import { enter } from '@/app/view';
import { Wordmark } from '@/components/devices/wordmark';
import { NavLink } from '@/components/shell/nav-link';
import { PersonMenu } from '@/components/shell/person-menu';
import { checkDoors } from '@/components/shell/rooms';
import { SkipLink } from '@/components/shell/skip-link';

const all = checkDoors.map((door) => door.href);

/** The Check room: the queue is the navigation of the page; above it stand only the three piles. */
export default async function CheckLayout({ children }: { children: ReactNode }) {
  const actor = await enter('version.read');
  return (
    <div data-theme="auto" className="min-h-dvh">
      <SkipLink />
      <header className="ground-deep flex min-h-15 flex-wrap items-center gap-x-5 px-4 md:px-6">
        <Link href="/" className="hidden sm:block">
          <Wordmark small />
        </Link>
        <nav aria-label="Check room" className="flex flex-1 self-stretch">
          {checkDoors.map((door) => (
            <NavLink
              key={door.href}
              href={door.href}
              all={all}
              className="inline-flex min-h-15 items-center border-b-4 border-transparent px-3 font-semibold"
              here="border-b-on-enamel-copper!"
            >
              {door.label}
            </NavLink>
          ))}
        </nav>
        <PersonMenu actor={actor} />
      </header>
      {children}
    </div>
  );
}
