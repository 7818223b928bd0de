import type { Actor } from '@/services/access/actor';
import { can } from '@/services/access/can';
import { Icon } from '@/components/ui/icon';
import { NavLink } from './nav-link';
import { PersonMenu } from './person-menu';
import type { Door } from './rooms';

/** The bottom dock of the floor rooms: targets for gloves, always in the same place. The page scrolls above it, never under. */
export function Dock({ label, doors, actor }: { label: string; doors: readonly Door[]; actor: Actor }) {
  const open = doors.filter((door) => can(actor, door.deed));
  const all = open.map((door) => door.href);
  return (
    <nav aria-label={label} className="ground-deep z-20 flex h-dock shrink-0">
      {open.map((door) => (
        <NavLink
          key={door.href}
          href={door.href}
          all={all}
          className="flex flex-1 flex-col items-center justify-center gap-1 border-r border-plate-line text-caption font-bold sm:text-floor"
          here="border-t-4 border-t-copper bg-paper text-ink"
        >
          <Icon name={door.icon} size={24} />
          {door.label}
        </NavLink>
      ))}
      <div className="grid w-20 place-items-center sm:w-28">
        <PersonMenu actor={actor} opens="above" />
      </div>
    </nav>
  );
}
