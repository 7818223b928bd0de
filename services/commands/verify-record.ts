import { existsSync } from 'node:fs';
import { openDatabase, setDatabase } from '@/db/client';
import { systemActor } from '../access';
import * as people from '../people';

/** `npm run -s verify-record`: recomputes the record of changes line by line; exits 1 when a line does not hold. */
const filename = process.env['COILYARD_DATABASE'] ?? 'data/coilyard.sqlite';
if (existsSync(filename)) {
  const sql = openDatabase(filename, { busyTimeoutMs: 5000 });
  setDatabase(sql);
  const report = await people.verifyChanges(systemActor('command')).finally(() => sql.destroy());
  if (report.holds) console.log(`${report.lines} lines hold. The last one ends in ${report.head || 'nothing yet'}.`);
  else {
    console.error(report.sentence);
    process.exitCode = 1;
  }
} else {
  console.error(`${filename} is not there. Name the database in COILYARD_DATABASE, or run npm run db:migrate first.`);
  process.exitCode = 1;
}
