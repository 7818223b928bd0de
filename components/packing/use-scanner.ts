'use client';

import { type RefObject, useEffect, useRef } from 'react';

/** A scanner types faster than any hand: gaps up to this are one code. Milliseconds. */
const fastest = 60;
/** A burst of fewer characters is no code of ours. */
const shortest = 4;

interface Burst {
  text: string;
  lastAt: number;
  /** The field that the burst landed in, and what stood there before it. */
  field: HTMLInputElement | HTMLTextAreaElement | null;
  before: string;
}

/**
 * Hears a scanner wherever the focus is. A scanner is a keyboard that ends with Enter. What is typed outside a field,
 * by scanner or by hand, goes into the scan field, whose form sends it; a burst that lands in another field is taken out
 * of it again, and its Enter presses nothing.
 */
export function useScanner(scanField: RefObject<HTMLInputElement | null>, onScan: (code: string) => void): void {
  const heard = useRef(onScan);
  useEffect(() => {
    heard.current = onScan;
  }, [onScan]);

  useEffect(() => {
    let burst: Burst = empty();

    function hear(event: KeyboardEvent) {
      if (event.ctrlKey || event.metaKey || event.altKey || event.isComposing) return;
      if (event.target === scanField.current && event.target !== null) return;
      const field = editable(event.target);
      if (field === null) {
        // The key itself still lands in the field that has the focus then.
        if (event.key.length === 1 && event.key !== ' ') scanField.current?.focus({ preventScroll: true });
        return;
      }
      const isFast = event.timeStamp - burst.lastAt <= fastest && burst.field === field;
      if (event.key === 'Enter') {
        if (isFast && burst.text.length >= shortest) {
          event.preventDefault();
          event.stopImmediatePropagation();
          restore(burst);
          heard.current(burst.text);
        }
        burst = empty();
        return;
      }
      if (event.key.length !== 1) return;
      if (!isFast) burst = { text: '', lastAt: 0, field, before: field.value };
      burst.text += event.key;
      burst.lastAt = event.timeStamp;
    }

    document.addEventListener('keydown', hear, { capture: true });
    return () => document.removeEventListener('keydown', hear, { capture: true });
  }, [scanField]);
}

const empty = (): Burst => ({ text: '', lastAt: -Infinity, field: null, before: '' });

function editable(target: EventTarget | null): HTMLInputElement | HTMLTextAreaElement | null {
  if (target instanceof HTMLTextAreaElement) return target;
  const typed = ['text', 'search', 'number', 'tel', 'email', 'url', 'password'];
  return target instanceof HTMLInputElement && typed.includes(target.type) ? target : null;
}

/** Puts a field back as it was; React hears of it like of any typing. */
function restore({ field, before }: Burst): void {
  if (!field) return;
  const proto = field instanceof HTMLTextAreaElement ? HTMLTextAreaElement.prototype : HTMLInputElement.prototype;
  Object.getOwnPropertyDescriptor(proto, 'value')?.set?.call(field, before);
  field.dispatchEvent(new Event('input', { bubbles: true }));
}
