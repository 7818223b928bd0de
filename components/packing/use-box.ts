'use client';

import { useCallback, useRef, useState } from 'react';
import type { ActionResult } from '@/components/forms/action-result';
import type { BoxView, ScanAnswer } from '@/services/packing/schemas';
import type { BoxDeeds } from './deeds';

/** What the last thing done came to, as the panel shows it until the next. */
export type Answer =
  | {
      kind: 'right' | 'wrong';
      title: string;
      sentence: string;
      at: number;
      rest: ScanAnswer['rest'];
      lineId: string | null;
    }
  | { kind: 'problem'; title: string; sentence: string };

/** How long to wait before a scan that found no line is sent again. */
const again = 3000;

/**
 * The box on the screen and everything done to it, one after the other: a scanner is faster than the line to the yard,
 * so what is scanned meanwhile waits its turn, and what finds no line is kept and sent again.
 */
export function useBox(initial: BoxView, deeds: BoxDeeds, sound: (kind: 'right' | 'wrong') => void) {
  const [box, setBox] = useState(initial);
  const [answer, setAnswer] = useState<Answer | null>(null);
  const [waiting, setWaiting] = useState(0);
  const [isOffline, setOffline] = useState(false);
  const line = useRef<Promise<unknown>>(Promise.resolve());

  /** Sends a deed when those before it are through; the answer is a value, or a problem that is shown. */
  const send = useCallback(
    <Value>(deed: () => Promise<ActionResult<Value>>, take: (value: Value) => void): Promise<boolean> => {
      setWaiting((count) => count + 1);
      const turn = line.current.then(async () => {
        try {
          const result = await untilHeard(deed, setOffline);
          if (result.ok) {
            take(result.value);
            return true;
          }
          sound('wrong');
          setAnswer({ kind: 'problem', title: 'Not done', sentence: result.problem.sentence });
          return false;
        } finally {
          setWaiting((count) => count - 1);
        }
      });
      line.current = turn;
      return turn;
    },
    [sound],
  );

  const scan = useCallback(
    (code: string, pieces = 1) =>
      send(
        () => deeds.scan({ boxId: initial.id, code, pieces }),
        (value: ScanAnswer) => {
          const { right, title, sentence, at, rest, lineId } = value;
          sound(right ? 'right' : 'wrong');
          setAnswer({ kind: right ? 'right' : 'wrong', title, sentence, at, rest, lineId });
          setBox(value.box);
        },
      ),
    [deeds, initial.id, send, sound],
  );

  /** Any deed that answers the box as it is now. */
  const change = useCallback(
    (deed: () => Promise<ActionResult<BoxView>>) =>
      send(deed, (next: BoxView) => {
        setBox(next);
        setAnswer(null);
      }),
    [send],
  );

  return { box, answer, dismiss: () => setAnswer(null), scan, change, isBusy: waiting > 0, isOffline };
}

/** A server action that throws found no line; it is asked again until it answers. The deeds themselves never throw. */
async function untilHeard<Value>(
  deed: () => Promise<ActionResult<Value>>,
  setOffline: (is: boolean) => void,
): Promise<ActionResult<Value>> {
  for (;;) {
    try {
      const result = await deed();
      setOffline(false);
      return result;
    } catch {
      setOffline(true);
      await new Promise((resolve) => setTimeout(resolve, again));
    }
  }
}
