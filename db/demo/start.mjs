// `npm run demo`: everything from a fresh clone to a running product on demo data. Ctrl-C stops all of it.
import { rmSync } from 'node:fs';
import { join } from 'node:path';
import {
  Stop,
  build,
  checkNode,
  demoEnvironment,
  fail,
  install,
  isFree,
  prepareDatabase,
  root,
  say,
  startProduct,
} from './steps.mjs';

const port = Number(process.env.PORT ?? 3000);
const ports = { port, payPort: 12_111, smtpPort: 1025, mailPort: 1080 };
const database = join(root, 'data/demo.sqlite');

async function main() {
  checkNode();
  for (const [name, number] of Object.entries(ports)) {
    if (await isFree(number)) continue;
    const remedy = name === 'port' ? 'Choose another: PORT=3001 npm run demo.' : 'Stop what uses it, then start again.';
    throw new Stop(`Port ${number} is taken. ${remedy}`);
  }
  if (process.argv.includes('--fresh')) {
    say('Removing the demo data of last time');
    for (const end of ['', '-wal', '-shm']) rmSync(database + end, { force: true });
  }
  install();
  build();
  const environment = demoEnvironment({ ...ports, database });
  prepareDatabase(environment);
  say('Starting payment and mail stand-ins, worker and product');
  const product = await startProduct({ environment, ...ports });

  console.log(`
   Coilyard is open.

   The shop           ${environment.COILYARD_URL}
   Demo sign-ins      ${environment.COILYARD_URL}/demo
   Mail that it sent  http://127.0.0.1:${ports.mailPort}

   Ctrl-C stops everything. The data stays in data/demo.sqlite; npm run demo -- --fresh begins anew.
`);
  for (const signal of ['SIGINT', 'SIGTERM']) {
    process.once(signal, () => {
      console.log('\nClosing the yard.');
      void product.stop().then(() => process.exit(0));
    });
  }
}

main().catch(fail);
