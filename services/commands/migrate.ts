import { database, openDatabase, setDatabase } from '@/db/client';
import { migrationSource } from '@/db/migrations';

/** `npm run db:migrate`: brings the database to the newest form; `--down` takes the last step back. */
const filename = process.env['COILYARD_DATABASE'] ?? 'data/coilyard.sqlite';
setDatabase(openDatabase(filename, { busyTimeoutMs: 5000 }));
const sql = database();
const migrate = process.argv.includes('--down') ? sql.migrate.down : sql.migrate.latest;
const [, done] = (await migrate.call(sql.migrate, { migrationSource })) as [number, string[]];
const faults: unknown[] = await sql.raw('pragma foreign_key_check');
await sql.destroy();
if (faults.length > 0) {
  console.error(`${filename}: ${faults.length} rows point at something that is not there. Restore the last backup.`);
  process.exit(1);
}
console.log(done.length === 0 ? `${filename} is up to date.` : `${filename}: ${done.join(', ')} done.`);
