/**
 * A process of its own that buys, for tests of two processes on one file.
 * Arguments: the database file, the version, how many buyers at once. Prints one JSON line: how many got a kit.
 */
import { openDatabase, setDatabase } from '@/db/client';
import { visitor } from '@/services/access';
import { newId } from '@/services/ids';
import { changeBasket, placeOrder } from '@/services/orders';
import { Problem } from '@/services/problem';
import { VersionId } from '@/services/ids';

const [filename = '', version = '', count = '1'] = process.argv.slice(2);
const sql = openDatabase(filename, { busyTimeoutMs: 5000 });
setDatabase(sql);

async function buy(): Promise<string> {
  const basketId = newId();
  await changeBasket(visitor, { basketId, versionId: VersionId.parse(version), quantity: 1 });
  try {
    await placeOrder(visitor, {
      basketId,
      email: 'ann@example.org',
      name: 'Ann Tarrant',
      address: { line1: '3 Quay Street', town: 'Pellstow', country: 'GB' },
      deliveryCode: 'parcel',
    });
    return 'got it';
  } catch (error) {
    if (!(error instanceof Problem)) throw error;
    return error.message;
  }
}

const answers = await Promise.all(Array.from({ length: Number(count) }, buy));
process.stdout.write(`${JSON.stringify(answers)}\n`);
await sql.destroy();
