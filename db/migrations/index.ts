import type { Knex } from 'knex';
import * as record from './001-record';
import * as people from './002-people';
import * as parts from './003-parts';
import * as kits from './004-kits';
import * as stock from './005-stock';
import * as orders from './006-orders';
import * as packing from './007-packing';

interface Named extends Knex.Migration {
  name: string;
}

const migrations: Named[] = [
  { name: '001-record', ...record },
  { name: '002-people', ...people },
  { name: '003-parts', ...parts },
  { name: '004-kits', ...kits },
  { name: '005-stock', ...stock },
  { name: '006-orders', ...orders },
  { name: '007-packing', ...packing },
];

/** Imported, not read from a folder: the same list in tests, commands and wherever the build is unpacked. */
export const migrationSource: Knex.MigrationSource<Named> = {
  getMigrations: () => Promise.resolve(migrations),
  getMigrationName: (migration) => migration.name,
  getMigration: (migration) => Promise.resolve(migration),
};
