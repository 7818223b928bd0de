import { openDatabase, setDatabase } from '@/db/client';
import { env } from '../env';
import { log } from '../log';
import { startWorker } from '.';

/** `npm run worker`: sends mails, lets reservations lapse, asks about open payments. Ends cleanly on a signal. */
function start(): void {
  // A process of its own may wait for the lock longer than a page may.
  const sql = openDatabase(env().COILYARD_DATABASE, { busyTimeoutMs: 5000 });
  setDatabase(sql);
  const worker = startWorker();
  log().info('worker started');

  let ending = false;
  async function end(): Promise<void> {
    if (ending) return;
    ending = true;
    await worker.stop();
    await sql.destroy();
    log().info('worker stopped');
  }
  for (const signal of ['SIGTERM', 'SIGINT'] as const) process.on(signal, () => void end());
}

try {
  start();
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
}
