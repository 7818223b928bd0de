import { openDatabase, setDatabase } from '@/db/client';
import { parseEnv } from '@/services/env';
import { reading } from '@/services/record';
import { fillBench, fillParts } from './fill-bench';
import { fillOrders, setTrade } from './fill-orders';
import { fillStore } from './fill-store';
import { endClock, hirePeople, startClock } from './yard';

/** Fills an empty database with the demo yard, by the same deeds that people do through the pages. */
const { COILYARD_DATABASE: filename } = parseEnv(process.env);
setDatabase(openDatabase(filename, { busyTimeoutMs: 5000 }));

const somebody = await reading()('people').first('id');
if (somebody) console.log('   the yard of last time is there and stays as it is');
else {
  startClock();
  const steps: [string, () => Promise<void>][] = [];
  const step = (what: string, deed: () => Promise<void>) => steps.push([what, deed]);
  step('people', async () => {
    await hirePeople();
    await setTrade();
  });
  step('parts, kits and what the check room said', async () => {
    const ids = await fillParts();
    await fillStore(ids);
    await fillBench(ids);
  });
  step('orders, boxes and parcels of six weeks', fillOrders);
  for (const [index, [what, deed]] of steps.entries()) {
    console.log(`   ${index + 1} of ${steps.length}: ${what}`);
    await deed();
  }
  // The story's mails were read long ago; only what happens from now on is sent.
  await reading()('outbox').where({ state: 'waiting' }).update({ state: 'done', done_at: Date.now() });
  endClock();
}
await reading().destroy();
