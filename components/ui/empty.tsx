import type { ReactNode } from 'react';

export type EmptyProps = {
  /** A drawing of what would be here. */
  drawing?: ReactNode;
  title: ReactNode;
  /** One line: what would bring something here. */
  children: ReactNode;
  level?: 2 | 3;
};

export function Empty({ drawing, title, children, level = 2 }: EmptyProps) {
  const Heading = `h${level}` as const;
  return (
    <div className="grid justify-items-center rounded-panel border-1.5 border-dashed border-edge px-6 py-6 text-center">
      {drawing !== undefined && <div className="mb-2">{drawing}</div>}
      <Heading className="font-display text-panel">{title}</Heading>
      <p className="max-w-measure">{children}</p>
    </div>
  );
}
