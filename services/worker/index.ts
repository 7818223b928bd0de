import 'server-only';
import { systemActor } from '../access';
import * as orders from '../orders';
import * as packing from '../packing';
import * as payments from '../payments';
import { emptyOutbox, repeat } from './loop';
import { closeTransport } from './handlers/transport';

const worker = systemActor('worker');

/** One round of everything the worker does, for tests and for the demo's first filling. */
export async function runWorkerOnce(): Promise<{ sent: number; failed: number }> {
  await orders.lapseReservations(worker);
  await payments.reconcile(worker);
  await packing.prepareBoxes(worker);
  return emptyOutbox();
}

/** Starts the rounds: mail every second, lapsed reservations and boxes to pack every 15 s, open payments every minute. */
export function startWorker(): { stop(): Promise<void> } {
  let stopping = false;
  const rounds = [
    repeat('mail', 1000, () => emptyOutbox(() => stopping)),
    repeat('lapsed reservations', 15_000, () => orders.lapseReservations(worker)),
    repeat('boxes of allocated orders', 15_000, () => packing.prepareBoxes(worker)),
    repeat('open payments', 60_000, () => payments.reconcile(worker)),
  ];
  return {
    async stop() {
      stopping = true;
      await Promise.all(rounds.map((round) => round.stop()));
      closeTransport();
    },
  };
}
