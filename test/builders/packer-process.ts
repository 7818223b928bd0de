/**
 * A process of its own that packs, for tests of two packers on one file.
 * Arguments: the database file, the packer's id, the moment to begin, the boxes. Prints one JSON line: the boxes it got.
 */
import { openDatabase, setDatabase } from '@/db/client';
import type { Actor } from '@/services/access';
import { BoxId, PersonId } from '@/services/ids';
import { claimBox } from '@/services/packing';
import { Problem } from '@/services/problem';

const [filename = '', person = '', begin = '0', boxes = ''] = process.argv.slice(2);
const sql = openDatabase(filename, { busyTimeoutMs: 5000 });
setDatabase(sql);
const packer: Actor = {
  kind: 'staff',
  id: PersonId.parse(person),
  name: 'Packer',
  email: 'packer@example.org',
  roles: ['packer'],
};

const got: string[] = [];
const refusals: string[] = [];
await new Promise((resolve) => setTimeout(resolve, Math.max(0, Number(begin) - Date.now())));
for (const id of boxes.split(',')) {
  try {
    await claimBox(packer, { boxId: BoxId.parse(id) });
    got.push(id);
  } catch (error) {
    if (!(error instanceof Problem)) throw error;
    refusals.push(error.message);
  }
}
process.stdout.write(`${JSON.stringify({ got, refusals })}\n`);
await sql.destroy();
