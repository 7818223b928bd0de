import { createHash, randomUUID } from 'node:crypto';
import { copyFileSync, existsSync, mkdtempSync, readdirSync, readFileSync, renameSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { Knex } from 'knex';
import { afterAll, beforeAll } from 'vitest';
import { openDatabase, setDatabase } from '@/db/client';
import { migrationSource } from '@/db/migrations';
import { setClock } from '@/services/record';

const migrationsFolder = fileURLToPath(new URL('../../db/migrations/', import.meta.url));

export interface TestDatabase {
  /** The file's own connection: the same one the deeds use. Ready inside hooks and tests. */
  readonly sql: Knex;
  readonly filename: string;
  /** A second connection to the same file, as another process would hold. Closed when the test file ends. */
  openAnother(options?: { busyTimeoutMs?: number }): Knex;
}

/**
 * Gives the calling test file its own migrated database, a copy of a template that is migrated once for each state of
 * the migrations. Call it once at the top of the file; it is open in `beforeAll` hooks that stand below the call.
 */
export function testDatabase(): TestDatabase {
  setTestEnvironment();
  let sql: Knex | undefined;
  let folder = '';
  const others: Knex[] = [];
  const filename = () => join(folder, 'coilyard.sqlite');

  beforeAll(async () => {
    folder = mkdtempSync(join(tmpdir(), 'coilyard-test-'));
    copyFileSync(await migratedTemplate(), filename());
    sql = openDatabase(filename(), { busyTimeoutMs: 250, acquireTimeoutMs: 2000 });
    setDatabase(sql);
  });

  afterAll(async () => {
    setClock(undefined);
    setDatabase(undefined);
    for (const connection of [...others, sql]) await connection?.destroy();
    rmSync(folder, { recursive: true, force: true });
  });

  return {
    get sql() {
      if (!sql) throw new Error('The test database is open inside hooks and tests, not while the file is collected.');
      return sql;
    },
    get filename() {
      return filename();
    },
    openAnother({ busyTimeoutMs = 250 } = {}) {
      const another = openDatabase(filename(), { busyTimeoutMs, acquireTimeoutMs: 2000 });
      others.push(another);
      return another;
    },
  };
}

/** Configuration that deeds read through `env()`, unless the caller has set its own before. */
function setTestEnvironment(): void {
  const settings = {
    COILYARD_DATABASE: 'set-by-test-database',
    COILYARD_URL: 'http://127.0.0.1:3000',
    NEXTAUTH_SECRET: 'a secret that only the tests of the yard know',
    STRIPE_SECRET_KEY: 'sk_test_coilyard',
    STRIPE_WEBHOOK_SECRET: 'whsec_test_coilyard',
    STRIPE_API_HOST: '127.0.0.1:12111',
    SMTP_HOST: '127.0.0.1',
    SMTP_PORT: '1025',
    MAIL_FROM: 'Coilyard <yard@coilyard.example>',
    LOG_LEVEL: 'silent',
  };
  for (const [name, value] of Object.entries(settings)) process.env[name] ??= value;
}

/** Made by whichever test process comes first; the others find it. Two at once both make it, and one rename wins. */
async function migratedTemplate(): Promise<string> {
  const template = join(tmpdir(), `coilyard-template-${hashOfMigrations()}.sqlite`);
  if (existsSync(template)) return template;
  const unfinished = `${template}.${randomUUID()}`;
  const sql = openDatabase(unfinished);
  await sql.migrate.latest({ migrationSource });
  // Closing the last connection writes the log back into the one file that is then copied.
  await sql.destroy();
  renameSync(unfinished, template);
  return template;
}

function hashOfMigrations(): string {
  const hash = createHash('sha256');
  for (const name of readdirSync(migrationsFolder).sort()) hash.update(readFileSync(join(migrationsFolder, name)));
  hash.update(readFileSync(join(migrationsFolder, '../dialect.ts')));
  return hash.digest('hex').slice(0, 16);
}
