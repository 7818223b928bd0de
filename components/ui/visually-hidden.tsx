import type { ReactNode } from 'react';

/** Read aloud, not shown. */
export function VisuallyHidden({ children, id }: { children: ReactNode; id?: string }) {
  return (
    <span className="sr-only" {...(id === undefined ? {} : { id })}>
      {children}
    </span>
  );
}
