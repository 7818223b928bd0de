import Link from 'next/link';
import { Wordmark } from '@/components/devices/wordmark';
import { Icon } from '@/components/ui/icon';
import type { Actor } from '@/services/access/actor';
import { NavLink } from './nav-link';
import { PersonMenu } from './person-menu';

const doors = [
  { href: '/', label: 'Kits' },
  { href: '/orders', label: 'My orders' },
];
const all = doors.map((door) => door.href);

/** The catalogue bar. The search is a plain form, so that it works before any script does. */
export function ShopBar({ actor, inBasket = 0 }: { actor: Actor; inBasket?: number }) {
  return (
    <header className="border-b border-rule bg-paper">
      <div className="mx-auto flex min-h-18 max-w-page flex-wrap items-center gap-x-6 px-4 max-md:pt-3 sm:px-6">
        <Link href="/">
          <Wordmark />
        </Link>
        <nav aria-label="Shop" className="order-last flex basis-full gap-7 self-stretch md:order-none md:basis-auto">
          {doors.map((door) => (
            <NavLink
              key={door.href}
              href={door.href}
              all={all}
              className="inline-flex min-h-target items-center border-b-4 border-transparent font-semibold md:min-h-18"
              here="border-b-copper!"
            >
              {door.label}
            </NavLink>
          ))}
        </nav>
        <form action="/" role="search" className="ml-auto hidden sm:block">
          <label className="flex min-h-target items-center gap-3 rounded-control border-1.5 border-edge bg-card px-3 focus-within:outline-3 focus-within:outline-offset-2 focus-within:outline-enamel">
            <Icon name="search" />
            <span className="sr-only">Find a kit</span>
            <input name="q" type="search" placeholder="Find a kit" className="w-40 bg-transparent outline-none" />
          </label>
        </form>
        <Link href="/basket" className="ml-auto inline-flex min-h-target items-center gap-2 font-semibold sm:ml-0">
          <Icon name="basket" size={24} />
          <span className="hidden sm:inline">Basket</span>
          <span className="sr-only sm:hidden">Basket</span>
          {inBasket > 0 && (
            <span className="grid min-w-6 place-items-center rounded-full bg-plate px-1.5 font-figures text-caption text-on-enamel">
              {inBasket}
            </span>
          )}
        </Link>
        <PersonMenu actor={actor} />
      </div>
    </header>
  );
}
