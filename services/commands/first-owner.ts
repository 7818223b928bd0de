import { createInterface } from 'node:readline/promises';
import { openDatabase, setDatabase } from '@/db/client';
import { systemActor } from '../access';
import { env } from '../env';
import * as people from '../people';
import { Problem } from '../problem';

/**
 * `npm run first-owner -- --name "..." --email ...`: makes the owner that a new installation begins with. The password
 * is asked for, or read from COILYARD_OWNER_PASSWORD, so that it stands in no list of commands.
 */
const option = (name: string) => {
  const at = process.argv.indexOf(`--${name}`);
  return at < 0 ? undefined : process.argv[at + 1];
};

async function ask(question: string): Promise<string> {
  const lines = createInterface({ input: process.stdin, output: process.stdout });
  const answer = await lines.question(question);
  lines.close();
  return answer;
}

try {
  const name = option('name') ?? (await ask('Name of the first owner: '));
  const email = option('email') ?? (await ask('E-mail address: '));
  const password = process.env['COILYARD_OWNER_PASSWORD'] ?? (await ask('Password, at least 8 characters: '));
  const sql = openDatabase(env().COILYARD_DATABASE, { busyTimeoutMs: 5000 });
  setDatabase(sql);
  const made = people.createFirstOwner(systemActor('command'), { name, email, password });
  const { secret, uri } = await made.finally(() => sql.destroy());
  console.log(`${name} is owner now. Enter this secret in an authenticator; it is shown this once:\n${secret ?? ''}`);
  console.log(`The same as an address that an authenticator opens:\n${uri ?? ''}`);
} catch (error) {
  const fields = error instanceof Problem && error.fields ? Object.values(error.fields) : [];
  console.error([error instanceof Error ? error.message : String(error), ...fields].join('\n'));
  process.exitCode = 1;
}
