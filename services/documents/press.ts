import { Worker } from 'node:worker_threads';
import type { PrintTask } from './paper';
import type { ThreadAnswer, ThreadTask } from './thread';

interface Waiting {
  done: (bytes: Uint8Array) => void;
  failed: (error: Error) => void;
}

/** One thread a process sets all papers, one after the other; it is started by the first and stays. */
let press: Worker | undefined;
let count = 0;
const waiting = new Map<number, Waiting>();

/**
 * Sets a paper. The built product does it in a thread, since a guide takes a second of one processor; tests, worker and
 * demo, whose loader starts no TypeScript thread, do it in place.
 */
export async function setPaper(task: PrintTask): Promise<Uint8Array> {
  // Next sets this while it bundles; it is absent under tsx and vitest.
  if (process.env['NEXT_RUNTIME'] === 'nodejs') return inThread(task);
  const { renderPdf } = await import('./render');
  return renderPdf(task);
}

function inThread(task: PrintTask): Promise<Uint8Array> {
  return new Promise((done, failed) => {
    const number = ++count;
    waiting.set(number, { done, failed });
    const message: ThreadTask = { ...task, number };
    thread().postMessage(message);
  });
}

function thread(): Worker {
  if (press) return press;
  const started = new Worker(new URL('./thread.tsx', import.meta.url));
  started.unref();
  started.on('message', (answer: ThreadAnswer) => {
    const asked = waiting.get(answer.number);
    waiting.delete(answer.number);
    if ('bytes' in answer) asked?.done(answer.bytes);
    else asked?.failed(new Error(answer.error));
  });
  const end = (error: Error) => {
    press = undefined;
    for (const asked of waiting.values()) asked.failed(error);
    waiting.clear();
  };
  started.on('error', end);
  started.on('exit', (code) => end(new Error(`The press stopped with code ${code}.`)));
  press = started;
  return started;
}
