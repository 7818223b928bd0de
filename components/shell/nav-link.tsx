'use client';

import Link, { useLinkStatus } from 'next/link';
import { usePathname } from 'next/navigation';
import type { ReactNode } from 'react';

/** The door whose address is the longest that the present one begins with is the one we stand in. */
export function isHere(path: string, href: string, all: readonly string[]): boolean {
  const fits = (door: string) => path === door || path.startsWith(door === '/' ? '/kits/' : `${door}/`);
  if (!fits(href)) return false;
  return !all.some((other) => other.length > href.length && fits(other));
}

type NavLinkProps = { href: string; all: readonly string[]; className: string; here: string; children: ReactNode };

export function NavLink({ href, all, className, here, children }: NavLinkProps) {
  const current = isHere(usePathname(), href, all);
  return (
    <Link href={href} className={`${className} ${current ? here : ''}`} {...(current && { 'aria-current': 'page' })}>
      {children}
      <Fetching />
    </Link>
  );
}

/** Says that the next page is on its way, once that has taken long enough to be worth saying. */
function Fetching() {
  const { pending } = useLinkStatus();
  return pending ? (
    <span
      role="status"
      className="wait-400 fixed right-4 bottom-28 z-40 rounded-panel bg-ink px-4 py-3 font-text text-body text-paper"
    >
      Fetching the page
    </span>
  ) : null;
}
