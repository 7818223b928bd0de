import type { ComponentProps, ReactNode } from 'react';
import { classes } from './classes';

export type PanelProps = Omit<ComponentProps<'section'>, 'title'> & {
  title?: ReactNode;
  /** One line under or beside the title. */
  note?: ReactNode;
  /** Stands at the right of the title: a link or a small button. */
  aside?: ReactNode;
  level?: 2 | 3 | 4;
  /** `card` raised, `open` under a 2 px rule, `sign` the signature box, `plate` on enamel, `copper` for classes, `dashed` for what is not there yet. */
  ground?: 'card' | 'open' | 'sign' | 'plate' | 'copper' | 'dashed';
};

const grounds: Record<NonNullable<PanelProps['ground']>, string> = {
  card: 'rounded-panel border border-rule bg-card p-4 sm:p-6',
  open: 'border-t-2 border-ink pt-3',
  sign: 'rounded-panel border-1.5 border-ink bg-paper p-4 sm:px-5',
  plate: 'ground-plate rounded-panel p-4 sm:p-6',
  copper: 'rounded-panel border-1.5 border-copper bg-copper-wash p-4 sm:p-7',
  dashed: 'rounded-panel border-1.5 border-dashed border-edge p-4 sm:p-6',
};

export function Panel(props: PanelProps) {
  const { title, note, aside, level = 2, ground = 'card', className, children, ...rest } = props;
  const Heading = `h${level}` as const;
  return (
    <section {...rest} className={classes(grounds[ground], className)}>
      {(title !== undefined || aside !== undefined) && (
        <div className="mb-3 flex flex-wrap items-baseline gap-x-3 gap-y-1">
          {title !== undefined && (
            <Heading className={classes('font-display', level === 2 ? 'text-section' : 'text-panel')}>{title}</Heading>
          )}
          {note !== undefined && (
            <p className={classes('text-caption', ground === 'plate' ? 'text-on-enamel2' : 'text-ink2')}>{note}</p>
          )}
          {aside !== undefined && <div className="ml-auto">{aside}</div>}
        </div>
      )}
      {children}
    </section>
  );
}
