import type { ReactNode } from 'react';
import { classes } from './classes';

/**
 * The page's real layout in ruled lines while it is fetched. Nothing is said for 400 ms, then the words.
 * Lay `SkeletonLine` and `SkeletonBox` where text and drawings will stand.
 */
export function Skeleton({ words = 'Fetching the page', children }: { words?: string; children: ReactNode }) {
  return (
    <div role="status" aria-live="polite">
      <p className="wait-400 mb-4 text-caption text-ink2">{words}</p>
      <div aria-hidden>{children}</div>
    </div>
  );
}

export function SkeletonLine({ className = 'w-full' }: { className?: string }) {
  return <div className={classes('skeleton-line', className)} />;
}

export function SkeletonBox({ className = 'h-24' }: { className?: string }) {
  return <div className={classes('rounded-panel border border-rule', className)} />;
}

/** So many ruled rows under a head rule, as a table will stand. */
export function SkeletonRows({ rows = 6 }: { rows?: number }) {
  return (
    <div>
      <div className="h-6 border-b-1.5 border-ink" />
      {Array.from({ length: rows }, (_, index) => (
        <div key={index} className="h-13 border-b border-rule" />
      ))}
    </div>
  );
}
