import type { ReactNode } from 'react';
import { classes } from './classes';
import { Sign, type SignKind } from './sign';

export type NoticeProps = {
  kind: Exclude<SignKind, 'waiting'>;
  /** The fact, in a few words. */
  title: ReactNode;
  /** The figure, and what to do. */
  children?: ReactNode;
  /** Links or buttons under the text. */
  actions?: ReactNode;
  /** A figure at the right of the title. */
  figure?: ReactNode;
  level?: 2 | 3 | 4;
  /** Said at once when it appears: `alert` for what stops the work, `status` for the rest. */
  live?: 'alert' | 'status';
  size?: 'desk' | 'floor';
  className?: string;
};

const looks: Record<NoticeProps['kind'], string> = {
  clears: 'border-pine bg-pine-wash',
  note: 'border-ochre bg-ochre-wash',
  stops: 'border-crimson bg-crimson-wash',
  // Enamel on its own wash falls under 7 to 1 in the dark: links in it are ink.
  info: 'border-enamel bg-enamel-wash [&_.link]:text-ink',
};
const titles: Record<NoticeProps['kind'], string> = {
  clears: 'text-pine',
  note: 'text-ochre',
  stops: 'text-crimson',
  info: 'text-ink',
};

export function Notice(props: NoticeProps) {
  const { kind, title, children, actions, figure, level, live, size = 'desk', className } = props;
  const Heading = level === undefined ? 'p' : (`h${level}` as const);
  return (
    <div
      {...(live !== undefined && { role: live })}
      className={classes(
        'flex rounded-panel border-1.5 text-ink',
        size === 'floor' ? 'gap-4 border-2 px-5 py-4 text-floor' : 'gap-3.5 px-4 py-3.5',
        looks[kind],
        className,
      )}
    >
      <Sign kind={kind} size={size === 'floor' ? 36 : 22} className="mt-px" />
      <div className="min-w-0 flex-1">
        <div className="flex gap-3">
          <Heading
            className={classes('flex-1 font-bold', titles[kind], size === 'floor' && 'text-[20px] leading-[26px]')}
          >
            {title}
          </Heading>
          {figure !== undefined && (
            <span className={classes('font-figures font-semibold', titles[kind])}>{figure}</span>
          )}
        </div>
        {children !== undefined && (
          <div className={size === 'floor' ? '' : 'text-table leading-[22px]'}>{children}</div>
        )}
        {actions !== undefined && <div className="mt-2 flex flex-wrap items-center gap-3">{actions}</div>}
      </div>
    </div>
  );
}

export type ErrorPanelProps = {
  /** What went wrong: "The label printer did not answer." */
  title: ReactNode;
  /** What is kept, and what to do. */
  children?: ReactNode;
  actions?: ReactNode;
  /** The number under which it was logged. */
  reference?: string | undefined;
};

/** An error in place, with the work kept. */
export function ErrorPanel({ title, children, actions, reference }: ErrorPanelProps) {
  return (
    <Notice kind="stops" title={title} actions={actions} live="alert">
      {children}
      {reference !== undefined && (
        <p className="mt-1 text-caption">
          If it happens again, tell us this number: <span className="font-figures">{reference}</span>
        </p>
      )}
    </Notice>
  );
}
