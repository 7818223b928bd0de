import Link from 'next/link';
import type { ReactNode } from 'react';
import { enter } from '@/app/view';
import { HouseInitial } from '@/components/devices/wordmark';
import { NavLink } from '@/components/shell/nav-link';
import { PersonMenu } from '@/components/shell/person-menu';
import { benchDoors } from '@/components/shell/rooms';
import { SkipLink } from '@/components/shell/skip-link';
import { Icon } from '@/components/ui/icon';

const all = benchDoors.map((door) => door.href);

/** The Bench: a spine of words under icons on the left; below 900 px a bar at the foot. */
export default async function BenchLayout({ children }: { children: ReactNode }) {
  const actor = await enter('kit.read-all');
  return (
    <div data-theme="auto" className="min-h-dvh md:pl-spine">
      <SkipLink />
      <nav
        aria-label="Bench"
        className="ground-deep fixed inset-x-0 bottom-0 z-20 flex h-18 items-stretch md:inset-y-0 md:right-auto md:h-auto md:w-spine md:flex-col md:pt-6 md:pb-4"
      >
        <Link href="/" className="mx-auto mb-3 hidden md:block">
          <HouseInitial />
        </Link>
        {benchDoors.map((door) => (
          <NavLink
            key={door.href}
            href={door.href}
            all={all}
            className="flex flex-1 flex-col items-center justify-center gap-1 text-caption font-semibold md:my-0.5 md:ml-2 md:flex-none md:rounded-l-panel md:py-2.5"
            here="bg-paper text-ink"
          >
            <Icon name={door.icon} size={24} />
            {door.label}
          </NavLink>
        ))}
        <div className="grid flex-1 place-items-center md:mt-auto md:flex-none">
          <span className="hidden md:block">
            <PersonMenu actor={actor} opens="beside" named />
          </span>
          <span className="md:hidden">
            <PersonMenu actor={actor} opens="above" />
          </span>
        </div>
      </nav>
      <div className="pb-18 md:pb-0">{children}</div>
    </div>
  );
}
