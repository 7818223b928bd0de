import type { ReactElement } from 'react';

/** The five shapes. What they mean in a room is said by the word beside them. */
export type SignKind = 'clears' | 'note' | 'stops' | 'info' | 'waiting';

const shapes: Record<SignKind, ReactElement> = {
  clears: (
    <>
      <circle cx="10" cy="10" r="9" className="fill-pine" />
      <path
        d="M5.8 10.2l3 3 5.4-6"
        fill="none"
        className="stroke-card"
        strokeWidth="2.2"
        strokeLinecap="round"
        strokeLinejoin="round"
      />
    </>
  ),
  note: (
    <>
      <path d="M10 1.5L19 18H1Z" className="fill-ochre-wash stroke-ochre" strokeWidth="1.8" strokeLinejoin="round" />
      <path d="M10 7v5.2" className="stroke-ochre" strokeWidth="2.2" strokeLinecap="round" />
      <circle cx="10" cy="15" r="1.3" className="fill-ochre" />
    </>
  ),
  stops: (
    <>
      <path d="M6.3 1h7.4L19 6.3v7.4L13.7 19H6.3L1 13.7V6.3Z" className="fill-crimson" />
      <path d="M5.5 10h9" className="stroke-card" strokeWidth="3" />
    </>
  ),
  info: (
    <>
      <rect
        x="1.5"
        y="1.5"
        width="17"
        height="17"
        rx="2"
        className="fill-enamel-wash stroke-enamel"
        strokeWidth="1.6"
      />
      <path d="M10 9v5" className="stroke-enamel" strokeWidth="2.2" strokeLinecap="round" />
      <circle cx="10" cy="5.8" r="1.4" className="fill-enamel" />
    </>
  ),
  waiting: (
    <circle cx="10" cy="10" r="8.2" fill="none" className="stroke-edge" strokeWidth="1.8" strokeDasharray="3 2.4" />
  ),
};

/** The shape alone, hidden from readers: a word must stand beside it. */
export function Sign({ kind, size = 20, className = '' }: { kind: SignKind; size?: number; className?: string }) {
  return (
    <svg aria-hidden className={`shrink-0 ${className}`} width={size} height={size} viewBox="0 0 20 20">
      {shapes[kind]}
    </svg>
  );
}
