'use client';

import { createContext, useCallback, useContext, useEffect, useState, type ReactNode } from 'react';
import { Icon } from './icon';
import { Sign } from './sign';

export type Toast = {
  /** "Box closed. Slip is printing." */
  sentence: string;
  /** Where the deed can be undone. */
  onUndo?: () => void;
};

type Say = (toast: Toast) => void;

const SayContext = createContext<Say | null>(null);

/** Says a thing that happened off screen. Never the only place an error shows. */
export function useToast(): Say {
  const say = useContext(SayContext);
  if (!say) throw new Error('useToast needs a ToastRegion above it.');
  return say;
}

const SHOWN_MS = 8_000;
const SHOWN_WITH_UNDO_MS = 20_000;

/** Wraps a page; keeps one toast at a time at the bottom left. Pointing at it or moving into it holds the clock. */
export function ToastRegion({ children }: { children: ReactNode }) {
  const [toast, setToast] = useState<(Toast & { id: number }) | null>(null);
  const [isHeld, setHeld] = useState(false);
  const say = useCallback<Say>((next) => setToast((last) => ({ ...next, id: (last?.id ?? 0) + 1 })), []);

  useEffect(() => {
    if (!toast || isHeld) return;
    const timer = setTimeout(() => setToast(null), toast.onUndo ? SHOWN_WITH_UNDO_MS : SHOWN_MS);
    return () => clearTimeout(timer);
  }, [toast, isHeld]);

  return (
    <SayContext value={say}>
      {children}
      <div
        role="status"
        aria-live="polite"
        className="fixed bottom-4 left-4 z-50 max-w-[calc(100vw-2rem)]"
        onPointerEnter={() => setHeld(true)}
        onPointerLeave={() => setHeld(false)}
        onFocus={() => setHeld(true)}
        onBlur={() => setHeld(false)}
      >
        {toast && <ToastBar key={toast.id} toast={toast} onDone={() => setToast(null)} />}
      </div>
    </SayContext>
  );
}

export function ToastBar({ toast, onDone }: { toast: Toast; onDone: () => void }) {
  return (
    <div className="flex min-h-target items-center gap-3 rounded-panel bg-ink py-1 pr-1 pl-4 text-paper [--focus:var(--toast-link)]">
      <Sign kind="clears" size={18} />
      <span>{toast.sentence}</span>
      {toast.onUndo && (
        <button
          type="button"
          className="min-h-target px-2 font-bold text-toast-link underline underline-offset-3"
          onClick={() => {
            toast.onUndo?.();
            onDone();
          }}
        >
          Undo
        </button>
      )}
      <button
        type="button"
        aria-label="Close this message"
        className="grid size-11 place-items-center"
        onClick={onDone}
      >
        <Icon name="close" size={16} />
      </button>
    </div>
  );
}
