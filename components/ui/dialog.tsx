'use client';

import { useEffect, useId, useRef, type ReactNode, type SyntheticEvent } from 'react';

export type DialogProps = {
  isOpen: boolean;
  /** Esc, a press outside, or the "not yet" answer. */
  onClose: () => void;
  /** The question: "Release Tollgate 4 G?" */
  title: ReactNode;
  /** What follows from the answer; also fields, where the deed needs a reason. */
  children?: ReactNode;
  /** Answers as buttons: the deed by its name, then "Not yet". */
  answers: ReactNode;
};

/**
 * Only for releasing, holding, removing and refunds. The native element keeps the focus inside, closes on Esc and
 * gives the focus back to what opened it.
 */
export function Dialog({ isOpen, onClose, title, children, answers }: DialogProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const id = useId();

  useEffect(() => {
    const element = dialog.current;
    if (!element) return;
    if (isOpen && !element.open) element.showModal();
    if (!isOpen && element.open) element.close();
  }, [isOpen]);

  function cancel(event: SyntheticEvent) {
    event.preventDefault();
    onClose();
  }

  return (
    <dialog
      ref={dialog}
      aria-labelledby={`${id}-title`}
      aria-describedby={`${id}-body`}
      onCancel={cancel}
      onClose={() => isOpen && onClose()}
      onMouseDown={(event) => event.target === dialog.current && onClose()}
      className="m-auto w-[min(32rem,calc(100vw-2rem))] rounded-panel border border-ink bg-card p-0 text-ink shadow-lift backdrop:bg-[rgb(22_27_43/0.5)]"
    >
      <div className="p-5 sm:px-6">
        <h2 id={`${id}-title`} className="mb-1.5 font-display text-section">
          {title}
        </h2>
        <div id={`${id}-body`} className="text-body">
          {children}
        </div>
        <div className="mt-5 flex flex-wrap gap-3">{answers}</div>
      </div>
    </dialog>
  );
}
