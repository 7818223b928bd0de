import { openDatabase, setDatabase } from '@/db/client';
import { systemActor } from '../access';
import { env } from '../env';
import type { Money } from '../money';
import * as orders from '../orders';
import * as people from '../people';
import { reading } from '../record';

/**
 * `npm run db:seed`: gives a new yard ways of delivery and a tax table to begin with, in the name of its owner. What is
 * set already stays as it is.
 */
const gbp = (minor: number): Money => ({ minor, currency: 'GBP' });

const methods = [
  { code: 'post', name: 'Post', promise: '3 to 5 working days', countries: ['GB'], price: gbp(390) },
  { code: 'parcel', name: 'Parcel, tracked', promise: '1 to 2 working days', countries: ['GB'], price: gbp(680) },
  { code: 'abroad', name: 'Parcel abroad', promise: '5 to 10 working days', countries: ['*'], price: gbp(1480) },
];

/** United Kingdom, standard rate of value added tax: 20 %. */
const rates = [{ country: 'GB', basisPoints: 2000 }];

async function seed(): Promise<void> {
  const owner = await people.ownerOfYard(systemActor('command'));
  const isSet = async (table: string) =>
    (await reading()(table).count({ count: '*' })).some(({ count }) => count !== 0);
  const steps = [
    { what: 'Ways of delivery', table: 'delivery_methods', set: () => orders.setDelivery(owner, { methods }) },
    { what: 'Tax inside prices', table: 'tax_rates', set: () => orders.setTax(owner, { rates }) },
  ];
  for (const { what, table, set } of steps) {
    const was = await isSet(table);
    if (!was) await set();
    console.log(`${what}: ${was ? 'set already, left as they are' : 'set; change them to what your yard charges'}.`);
  }
}

try {
  const sql = openDatabase(env().COILYARD_DATABASE, { busyTimeoutMs: 5000 });
  setDatabase(sql);
  await seed().finally(() => sql.destroy());
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
}
