import { parentPort } from 'node:worker_threads';
import type { PrintTask } from './paper';
import { renderPdf } from './render';

export interface ThreadTask extends PrintTask {
  number: number;
}
export type ThreadAnswer = { number: number; bytes: Uint8Array } | { number: number; error: string };

parentPort?.on('message', (task: ThreadTask) => {
  renderPdf(task).then(
    (bytes) => parentPort?.postMessage({ number: task.number, bytes }),
    (error: unknown) => parentPort?.postMessage({ number: task.number, error: String(error) }),
  );
});
