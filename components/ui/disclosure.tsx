import type { ReactNode } from 'react';
import { classes } from './classes';
import { Icon } from './icon';

export type DisclosureProps = {
  /** "Show as table". */
  summary: ReactNode;
  /** Read after the summary, where several on a page say the same: "of the reach". */
  of?: string;
  children: ReactNode;
  /** `link` beside a chart, `row` for questions and folded sections. */
  look?: 'link' | 'row';
  isOpen?: boolean;
  className?: string;
};

/** Native details: works without a script, and opens when the page is searched. */
export function Disclosure({ summary, of, children, look = 'link', isOpen = false, className }: DisclosureProps) {
  return (
    <details open={isOpen} className={classes('group', look === 'row' && 'border-b border-rule', className)}>
      <summary
        className={classes(
          'list-none items-center gap-2 [&::-webkit-details-marker]:hidden',
          look === 'link'
            ? 'link relative inline-flex text-caption before:absolute before:-inset-y-3 before:inset-x-0'
            : 'flex min-h-target py-2 font-bold',
        )}
      >
        {look === 'row' && <Icon name="open" size={18} className="text-ink2 group-open:rotate-180" />}
        <span>
          {summary}
          {of !== undefined && <span className="sr-only"> {of}</span>}
        </span>
      </summary>
      <div className={look === 'link' ? 'pt-3' : 'pb-4'}>{children}</div>
    </details>
  );
}
