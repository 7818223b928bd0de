'use client';

import { type ReactNode, useEffect, useRef } from 'react';

export interface PanelFrameProps {
  children: ReactNode;
  foot: ReactNode;
  /** Whenever this changes to something, what stands at the head is brought into sight. */
  attention: unknown;
}

/** What is read scrolls; what is pressed stays at the foot, in the same place whatever stands above it. */
export function PanelFrame({ children, foot, attention }: PanelFrameProps) {
  const body = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (attention) body.current?.scrollTo({ top: 0 });
  }, [attention]);
  return (
    <>
      <div
        ref={body}
        className="relative -mx-2 grid min-h-0 flex-1 grid-cols-[minmax(0,1fr)] content-start gap-3 overflow-y-auto px-2"
      >
        {children}
      </div>
      <div className="grid shrink-0 grid-cols-[minmax(0,1fr)] gap-3">{foot}</div>
    </>
  );
}
