import type { Knex } from 'knex';
import { databaseConfig } from './db/client';
import { migrationSource } from './db/migrations';

/** For Knex's own command line: `npx tsx node_modules/.bin/knex migrate:list`. */
const config: Knex.Config = {
  ...databaseConfig(process.env['COILYARD_DATABASE'] ?? 'data/coilyard.sqlite', { busyTimeoutMs: 5000 }),
  migrations: { migrationSource },
};

export default config;
