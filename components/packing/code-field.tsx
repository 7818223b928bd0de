'use client';

import { type RefObject, useId, useState } from 'react';
import { Icon } from '@/components/ui/icon';

export interface CodeFieldProps {
  ref: RefObject<HTMLInputElement | null>;
  value: string;
  onChange: (value: string) => void;
  onSend: (code: string) => void;
}

/**
 * Where a code is typed when a label cannot be scanned. A scanner needs no tap here first; the keyboard of the tablet
 * stays down until somebody taps the field.
 */
export function CodeField({ ref, value, onChange, onSend }: CodeFieldProps) {
  const id = useId();
  const [isTyped, setTyped] = useState(false);
  return (
    <form
      onSubmit={(event) => {
        event.preventDefault();
        // A scanner is faster than the page is drawn, so the field itself is asked.
        onSend(ref.current?.value ?? value);
      }}
      className="flex min-h-floor min-w-0 items-stretch rounded-control border-2 border-on-enamel bg-card text-ink focus-within:outline-3 focus-within:outline-offset-2 focus-within:outline-[#fcf9f2]"
    >
      <label htmlFor={id} className="flex shrink-0 items-center gap-2 pl-4 font-bold">
        <Icon name="hand" size={26} />
        Type a code
      </label>
      <input
        ref={ref}
        id={id}
        name="code"
        value={value}
        onChange={(event) => onChange(event.target.value)}
        onPointerDown={() => setTyped(true)}
        onBlur={() => setTyped(false)}
        inputMode={isTyped ? 'text' : 'none'}
        autoComplete="off"
        autoCapitalize="characters"
        spellCheck={false}
        className="w-0 min-w-0 flex-1 bg-transparent px-3 font-figures uppercase outline-none"
      />
      <button
        type="submit"
        className="min-w-floor rounded-r-control bg-plate-deep px-4 font-bold text-on-enamel outline-offset-[-7px]"
      >
        Enter
      </button>
    </form>
  );
}
