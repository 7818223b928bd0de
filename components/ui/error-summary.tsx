'use client';

import { useEffect, useRef } from 'react';
import { Sign } from './sign';

export type ErrorSummaryProps = {
  /** Changes with each attempt: the summary then takes the focus. */
  attempt: number;
  /** Field id and its sentence; without an id the sentence stands alone. */
  errors: readonly { fieldId?: string | undefined; sentence: string }[];
};

/** What must be mended before the form can be sent, with links to the fields. */
export function ErrorSummary({ attempt, errors }: ErrorSummaryProps) {
  const box = useRef<HTMLDivElement>(null);
  const told = useRef(0);
  const isShown = errors.length > 0;

  // Once an attempt: what goes wrong later, while a field is left, does not pull the reader away.
  useEffect(() => {
    if (!isShown || attempt <= told.current) return;
    told.current = attempt;
    box.current?.focus();
  }, [attempt, isShown]);

  if (!isShown) return null;
  return (
    <div
      ref={box}
      tabIndex={-1}
      role="alert"
      className="flex gap-3.5 rounded-panel border-1.5 border-crimson bg-crimson-wash px-4 py-3.5"
    >
      <Sign kind="stops" size={22} className="mt-px" />
      <div>
        <p className="font-bold text-crimson">
          {errors.length === 1 ? 'One thing to mend' : `${errors.length} things to mend`}
        </p>
        <ul>
          {errors.map(({ fieldId, sentence }) => (
            <li key={`${fieldId ?? ''} ${sentence}`}>
              {fieldId === undefined ? (
                sentence
              ) : (
                <a
                  href={`#${fieldId}`}
                  className="text-ink underline underline-offset-3"
                  onClick={(event) => {
                    event.preventDefault();
                    document.getElementById(fieldId)?.focus();
                  }}
                >
                  {sentence}
                </a>
              )}
            </li>
          ))}
        </ul>
      </div>
    </div>
  );
}
