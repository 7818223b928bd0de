import { mkdirSync, mkdtempSync, openSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { TestProject } from 'vitest/node';
import { demoEnvironment, freePorts, prepareDatabase, root, startProduct } from '../../db/demo/steps.mjs';

declare module 'vitest' {
  interface ProvidedContext {
    url: string;
    mailUrl: string;
    payUrl: string;
    database: string;
  }
}

/** Once for all walks: the built product on a fresh demo yard, with its stand-ins, on ports of its own. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const folder = mkdtempSync(join(tmpdir(), 'coilyard-walk-'));
  const artefacts = join(root, 'test/artefacts');
  mkdirSync(artefacts, { recursive: true });
  const [port = 0, payPort = 0, smtpPort = 0, mailPort = 0] = await freePorts(4);
  const database = join(folder, 'yard.sqlite');
  const environment = demoEnvironment({ port, payPort, smtpPort, database });
  prepareDatabase(environment);
  const output = openSync(join(artefacts, 'product.log'), 'w');
  const product = await startProduct({ environment, payPort, smtpPort, mailPort, output });
  project.provide('url', environment.COILYARD_URL);
  project.provide('mailUrl', `http://127.0.0.1:${mailPort}`);
  project.provide('payUrl', `http://127.0.0.1:${payPort}`);
  project.provide('database', database);
  return async () => {
    await product.stop();
    rmSync(folder, { recursive: true, force: true });
  };
}
