import { systemActor } from '../access';
import { log } from '../log';
import * as outbox from '../outbox';
import { sendMail } from './handlers/send-mail';

const worker = systemActor('worker');

/** Sends every mail that is due. Each handler runs outside any transaction: the database waits for nobody. */
export async function emptyOutbox(isStopping: () => boolean = () => false): Promise<{ sent: number; failed: number }> {
  const count = { sent: 0, failed: 0 };
  while (!isStopping()) {
    const job = await outbox.claimNext(worker, 'mail');
    if (!job) break;
    try {
      await sendMail(worker, job);
      await outbox.finish(worker, job);
      count.sent++;
    } catch (error) {
      const { givenUp } = await outbox.putOff(worker, job, causeOf(error));
      log()[givenUp ? 'error' : 'warn']({ jobId: job.id, attempts: job.attempts, givenUp }, 'mail not sent');
      count.failed++;
    }
  }
  return count;
}

/** What a person needs to see of a failure: a mail server's answer, without addresses it may repeat. */
const causeOf = (error: unknown): string =>
  (error instanceof Error ? error.message : String(error)).replace(/[^\s<>@]+@[^\s<>@]+/g, '(address)');

/**
 * Runs a piece of work again and again with a pause between, until it is told to stop. A failure is logged and the
 * next round tries again. Resolves when the round under way has ended.
 */
export function repeat(name: string, everyMs: number, work: () => Promise<unknown>): { stop(): Promise<void> } {
  let stopping = false;
  let wake: () => void = () => undefined;

  const pause = () =>
    new Promise<void>((resolve) => {
      const timer = setTimeout(resolve, everyMs);
      wake = () => {
        clearTimeout(timer);
        resolve();
      };
    });

  async function run(): Promise<void> {
    while (!stopping) {
      try {
        await work();
      } catch (error) {
        log().error({ work: name, error }, 'a round of the worker failed; the next one tries again');
      }
      if (!stopping) await pause();
    }
  }

  const running = run();
  return {
    stop() {
      stopping = true;
      wake();
      return running;
    },
  };
}
