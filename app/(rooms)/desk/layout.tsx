import Link from 'next/link';
import type { ReactNode } from 'react';
import { enter } from '@/app/view';
import { Wordmark } from '@/components/devices/wordmark';
import { NavLink } from '@/components/shell/nav-link';
import { PersonMenu } from '@/components/shell/person-menu';
import { deskDoors, rooms } from '@/components/shell/rooms';
import { SkipLink } from '@/components/shell/skip-link';
import { can } from '@/services/access';

const all = deskDoors.map((door) => door.href);

/** The Desk: ledger tabs, and doors across to the other rooms. */
export default async function DeskLayout({ children }: { children: ReactNode }) {
  const actor = await enter('desk.read');
  const others = rooms.filter((room) => room.href !== '/desk' && can(actor, room.deed));
  return (
    <div data-theme="auto" className="min-h-dvh">
      <SkipLink />
      <header className="mx-auto flex min-h-16 max-w-desk flex-wrap items-center gap-x-6 gap-y-2 px-4 py-2 sm:px-6">
        <Link href="/" className="mr-auto">
          <Wordmark small />
        </Link>
        <nav aria-label="Rooms" className="hidden gap-6 md:flex">
          {others.map((room) => (
            <Link key={room.href} href={room.href} className="inline-flex min-h-target items-center font-bold">
              {room.label}
            </Link>
          ))}
        </nav>
        <PersonMenu actor={actor} />
      </header>
      <nav aria-label="Desk" className="ground-deep">
        <div className="mx-auto flex max-w-desk overflow-x-auto px-4 sm:px-6">
          {deskDoors.map((door) => (
            <NavLink
              key={door.href}
              href={door.href}
              all={all}
              className="inline-flex min-h-target items-center px-4 font-semibold whitespace-nowrap"
              here="bg-paper text-ink"
            >
              {door.label}
            </NavLink>
          ))}
        </div>
      </nav>
      {children}
    </div>
  );
}
