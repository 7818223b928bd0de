import type { Knex } from 'knex';
import { KitId, VersionId, newId } from '../ids';
import { Currency } from '../money';
import type { PriceStep } from './schemas';

export interface Release {
  kitId: KitId;
  versionId: VersionId;
  code: string;
  releasedAt: number;
}

/** The released version of each kit that was released last, newest release first. */
export async function currentReleases(sql: Knex): Promise<Release[]> {
  const rows = await sql('versions')
    .join('sign_offs', 'sign_offs.version_id', 'versions.id')
    .join('kits', 'kits.id', 'versions.kit_id')
    .where({ 'versions.state': 'released', 'sign_offs.decision': 'released' })
    .orderBy([
      { column: 'sign_offs.at', order: 'desc' },
      { column: 'versions.created_at', order: 'desc' },
    ])
    .select<{ kitId: string; versionId: string; code: string; releasedAt: number }[]>(
      'kits.id as kitId',
      'versions.id as versionId',
      'kits.code as code',
      'sign_offs.at as releasedAt',
    );
  const first = new Map<string, Release>();
  for (const row of rows) {
    if (first.has(row.kitId)) continue;
    first.set(row.kitId, {
      ...row,
      kitId: KitId.parse(row.kitId),
      versionId: VersionId.parse(row.versionId),
    });
  }
  return [...first.values()];
}

/** Price steps by kit, smallest quantity first. */
export async function pricesOf(sql: Knex, kitIds: readonly string[]): Promise<Map<string, PriceStep[]>> {
  const rows = await sql('prices')
    .whereIn('kit_id', [...kitIds])
    .orderBy(['kit_id', 'from_quantity'])
    .select<{ kitId: string; fromQuantity: number; minor: number; currency: string }[]>(
      'kit_id as kitId',
      'from_quantity as fromQuantity',
      'unit_minor as minor',
      'currency',
    );
  const prices = new Map<string, PriceStep[]>(kitIds.map((id) => [id, []]));
  for (const { kitId, fromQuantity, minor, currency } of rows) {
    prices.get(kitId)?.push({ fromQuantity, unit: { minor, currency: Currency.parse(currency) } });
  }
  return prices;
}

export async function replacePrices(sql: Knex.Transaction, kitId: string, steps: readonly PriceStep[]): Promise<void> {
  await sql('prices').where({ kit_id: kitId }).delete();
  for (const { fromQuantity, unit } of steps) {
    await sql('prices').insert({
      id: newId(),
      kit_id: kitId,
      from_quantity: fromQuantity,
      unit_minor: unit.minor,
      currency: unit.currency,
    });
  }
}

/** What one piece, metre or gram of each part costs by its code, in minor units. */
export async function costsByCode(sql: Knex, codes: readonly string[]): Promise<Map<string, number>> {
  const rows = await sql('parts')
    .whereIn('code', [...codes])
    .select<{ code: string; cost: number }[]>('code', 'cost_minor as cost');
  return new Map(rows.map((row) => [row.code, row.cost]));
}
