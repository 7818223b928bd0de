import Link from 'next/link';
import type { ReactNode } from 'react';
import { classes } from './classes';

export type TabLink = { href: string; label: ReactNode; isCurrent?: boolean };

export type TabLinksProps = {
  label: string;
  links: readonly TabLink[];
  /** `folder` on paper (version tabs), `ledger` on deep enamel (Desk), `bar` underlined in copper. */
  look?: 'folder' | 'ledger' | 'bar';
  className?: string;
};

const looks = {
  folder: {
    list: 'gap-1 border-b border-rule',
    link: '-mb-px rounded-t-panel border border-b-0 px-4 py-2',
    current: 'border-rule bg-card text-ink',
    other: 'border-transparent text-ink hover:bg-well',
  },
  ledger: {
    list: 'ground-deep gap-1',
    link: 'px-4.5 py-2.5 font-semibold',
    current: 'bg-paper text-ink',
    other: 'text-on-enamel2 hover:bg-plate',
  },
  bar: {
    list: 'gap-6 border-b border-rule',
    link: 'border-b-4 px-0.5 py-2.5 font-semibold text-ink',
    current: 'border-copper',
    other: 'border-transparent hover:border-rule',
  },
} as const;

/** Tabs kept in the address: links with `aria-current`. They wrap rather than scroll sideways. */
export function TabLinks({ label, links, look = 'folder', className }: TabLinksProps) {
  const { list, link, current, other } = looks[look];
  return (
    <nav aria-label={label} className={className}>
      <ul className={classes('flex flex-wrap', list)}>
        {links.map(({ href, label: text, isCurrent = false }) => (
          <li key={href}>
            <Link
              href={href}
              aria-current={isCurrent ? 'page' : undefined}
              className={classes(
                'flex min-h-target items-center gap-2.5 no-underline',
                link,
                isCurrent ? current : other,
              )}
            >
              {text}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
