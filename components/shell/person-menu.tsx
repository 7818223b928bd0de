import Link from 'next/link';
import { Icon } from '@/components/ui/icon';
import type { Actor } from '@/services/access/actor';
import { can } from '@/services/access/can';
import { rooms } from './rooms';

const initials = (name: string) =>
  name
    .split(/\s+/)
    .map((word) => word.charAt(0))
    .slice(0, 2)
    .join('')
    .toUpperCase();

type PersonMenuProps = {
  actor: Actor;
  /** Where the list opens: under the initials, or beside them on the spine. */
  opens?: 'below' | 'above' | 'beside';
  /** The name under the initials, as the spine shows it. */
  named?: boolean;
};

const places = { below: 'right-0 top-full mt-2', above: 'right-0 bottom-full mb-2', beside: 'bottom-0 left-full ml-2' };

/** Initials that open the list of rooms one may enter, and one's own account. */
export function PersonMenu({ actor, opens = 'below', named = false }: PersonMenuProps) {
  if (actor.kind === 'visitor' || actor.kind === 'system') {
    return (
      <Link href="/sign-in" className="inline-flex min-h-target items-center gap-2 font-semibold">
        <Icon name="user" /> Sign in
      </Link>
    );
  }
  const open = rooms.filter((room) => can(actor, room.deed));
  return (
    <details className="relative" name="person">
      <summary className="flex min-h-target list-none flex-col items-center justify-center gap-1 [&::-webkit-details-marker]:hidden">
        <span className="grid size-9 place-items-center rounded-full border-1.5 border-copper bg-copper-wash text-head font-bold text-copper-ink">
          <span aria-hidden>{initials(actor.name)}</span>
          <span className="sr-only">{actor.name}: rooms and account</span>
        </span>
        {named && (
          <span aria-hidden className="text-head font-semibold">
            {actor.name.split(' ')[0]}
          </span>
        )}
      </summary>
      <div
        className={`absolute z-30 w-60 rounded-panel border [--focus:var(--enamel)] border-ink bg-card py-2 text-body text-ink shadow-lift ${places[opens]}`}
      >
        <p className="px-4 py-1 text-caption text-ink2">{actor.name}</p>
        <ul>
          {open.map((room) => (
            <MenuLink key={room.href} href={room.href} icon={room.icon} label={room.label} />
          ))}
          {actor.kind === 'customer' && <MenuLink href="/orders" icon="list" label="My orders" />}
          <MenuLink href="/" icon="basket" label="The shop" />
          <MenuLink href="/account" icon="user" label="Account and sign out" />
        </ul>
      </div>
    </details>
  );
}

function MenuLink({
  href,
  icon,
  label,
}: {
  href: string;
  icon: 'user' | (typeof rooms)[number]['icon'];
  label: string;
}) {
  return (
    <li>
      <Link href={href} className="flex min-h-target items-center gap-3 px-4 font-semibold hover:bg-enamel-wash">
        <Icon name={icon} /> {label}
      </Link>
    </li>
  );
}
