import type { ReactNode } from 'react';
import { classes } from './classes';

export type TagTone = 'plain' | 'enamel' | 'plate' | 'copper' | 'pine' | 'ochre' | 'crimson' | 'dashed';

const tones: Record<TagTone, string> = {
  plain: 'border-edge bg-card text-ink',
  enamel: 'border-enamel bg-enamel-wash text-ink',
  plate: 'border-plate-deep bg-plate text-on-enamel',
  copper: 'border-copper bg-copper-wash text-copper-ink',
  pine: 'border-pine bg-pine-wash text-pine',
  ochre: 'border-ochre bg-ochre-wash text-ochre',
  crimson: 'border-crimson bg-crimson-wash text-crimson',
  dashed: 'border-dashed border-edge bg-transparent text-ink2',
};

export type TagProps = { tone?: TagTone; figures?: boolean; className?: string; children: ReactNode };

/** A word on a small ground. It carries its meaning in the word, not in the colour. */
export function Tag({ tone = 'plain', figures = false, className, children }: TagProps) {
  return (
    <span
      className={classes(
        'inline-flex items-center gap-1.5 rounded-tag border px-2 text-head leading-[22px] font-bold whitespace-nowrap',
        figures && 'font-figures font-semibold',
        tones[tone],
        className,
      )}
    >
      {children}
    </span>
  );
}

/** A count in a round badge; `label` says what is counted. */
export function Badge({ count, label, tone = 'plate' }: { count: number; label: string; tone?: 'plate' | 'copper' }) {
  return (
    <span
      className={classes(
        'inline-grid h-5.5 min-w-5.5 place-items-center rounded-full px-1.5 text-head leading-none font-bold',
        tone === 'plate' ? 'bg-plate text-on-enamel' : 'bg-[#f4dfcb] text-[#6e340e]',
      )}
    >
      <span aria-hidden>{count}</span>
      <span className="sr-only">{`${count} ${label}`}</span>
    </span>
  );
}

/** Keys of the keyboard. */
export function Keys({ children }: { children: ReactNode }) {
  return (
    <kbd className="inline-block rounded-tag border border-b-2 border-edge bg-card px-1.5 py-0.5 font-figures text-axis text-ink2">
      {children}
    </kbd>
  );
}

/** A person by initials; the whole name is read out. */
export function Initials({ name, size = 'desk' }: { name: string; size?: 'desk' | 'floor' }) {
  const letters = name
    .split(/[\s.]+/)
    .filter((part) => part !== '')
    .map((part) => part[0] ?? '');
  const shown = [letters[0] ?? '', letters.length > 1 ? (letters.at(-1) ?? '') : '']
    .join('')
    .toLocaleUpperCase('en-GB');
  return (
    <span
      className={classes(
        'inline-grid shrink-0 place-items-center rounded-full border-1.5 border-copper bg-copper-wash font-bold text-copper-ink',
        size === 'floor' ? 'size-11 text-body' : 'size-8.5 text-head',
      )}
    >
      <span aria-hidden>{shown}</span>
      <span className="sr-only">{name}</span>
    </span>
  );
}
