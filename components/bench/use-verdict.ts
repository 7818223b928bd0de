'use client';

import { useEffect, useRef, useState } from 'react';
import type { VersionContent } from '@/services/kits/schemas';
import type { VerdictAnswer, VerdictRequest } from './verdict-messages';

/** Boxes of the quick refinement and of the one that equals the check sheet's. */
const QUICK = 2_000;
export const FULL = 20_000;
/** How long nothing is typed before the boxes are tried: while a slider moves, only first verdicts are worked out. */
const SHORT_PAUSE_MS = 100;
/** How long nothing is typed before the long one starts. */
const PAUSE_MS = 500;

export interface VerdictState {
  answer: VerdictAnswer | null;
  /** Boxes still being tried: 0 when the answer shown is the last word. */
  trying: number;
}

/**
 * The live verdict of what is on screen. A worker answers at once without boxes, then with 2,000; a second worker tries
 * 20,000 after a pause, and is given up when something changes meanwhile, so that typing never waits.
 */
export function useVerdict(content: VersionContent): VerdictState {
  const [state, setState] = useState<VerdictState>({ answer: null, trying: QUICK });
  const workers = useRef<{ quick: Worker | null; full: Worker | null; number: number }>({
    quick: null,
    full: null,
    number: 0,
  });

  useEffect(() => {
    const held = workers.current;
    const number = ++held.number;
    const take = (answer: VerdictAnswer, trying: number) => {
      if (answer.number !== held.number) return;
      setState((before) =>
        isFuller(before.answer, answer) ? before : { answer: withRemedies(answer, before.answer), trying },
      );
    };

    held.quick ??= start();
    held.quick.onmessage = ({ data }: MessageEvent<VerdictAnswer>) => {
      if (data.kind !== 'verdict') take(data, 0);
      else take(data, data.boxes === 0 ? QUICK : FULL);
    };
    ask(held.quick, { number, content, boxes: 0 });

    const soon = setTimeout(() => ask(held.quick, { number, content, boxes: QUICK }), SHORT_PAUSE_MS);
    const timer = setTimeout(() => {
      held.full = start();
      held.full.onmessage = ({ data }: MessageEvent<VerdictAnswer>) => take(data, 0);
      ask(held.full, { number, content, boxes: FULL });
    }, PAUSE_MS);
    return () => {
      clearTimeout(soon);
      clearTimeout(timer);
      held.full?.terminate();
      held.full = null;
    };
  }, [content]);

  useEffect(() => {
    const held = workers.current;
    return () => {
      held.quick?.terminate();
      held.quick = null;
    };
  }, []);

  return state;
}

/** The two workers may answer out of turn: the one with more boxes stands. */
const isFuller = (shown: VerdictAnswer | null, answer: VerdictAnswer) =>
  shown !== null && shown.number === answer.number && shown.boxes > answer.boxes;

/** A first answer has no remedies yet; the last ones stay in sight for the moment until the new ones are found. */
function withRemedies(answer: VerdictAnswer, before: VerdictAnswer | null): VerdictAnswer {
  if (answer.kind !== 'verdict' || answer.live.remedies !== null || before?.kind !== 'verdict') return answer;
  return { ...answer, live: { ...answer.live, remedies: before.live.remedies } };
}

const start = () => new Worker(new URL('./verdict-worker.ts', import.meta.url), { type: 'module' });

const ask = (worker: Worker | null, request: VerdictRequest) => worker?.postMessage(request);
