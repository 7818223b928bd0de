import type { Knex } from 'knex';
import { VersionId } from '../ids';

export interface BasketRow {
  versionId: VersionId;
  quantity: number;
}

export async function basketLines(sql: Knex, basketId: string): Promise<BasketRow[]> {
  const rows = await sql('basket_lines')
    .join('versions', 'versions.id', 'basket_lines.version_id')
    .join('kits', 'kits.id', 'versions.kit_id')
    .where({ 'basket_lines.basket_id': basketId })
    .orderBy(['kits.number', 'versions.letter'])
    .select<{ versionId: string; quantity: number }[]>({
      versionId: 'basket_lines.version_id',
      quantity: 'basket_lines.quantity',
    });
  return rows.map((row) => ({ versionId: VersionId.parse(row.versionId), quantity: row.quantity }));
}

export async function saveBasketLine(
  sql: Knex.Transaction,
  line: { basketId: string; versionId: string; quantity: number; at: number },
): Promise<void> {
  const { basketId, versionId, quantity, at } = line;
  await sql('baskets').insert({ id: basketId, updated_at: at }).onConflict('id').merge(['updated_at']);
  const key = { basket_id: basketId, version_id: versionId };
  if (quantity === 0) await sql('basket_lines').where(key).delete();
  else
    await sql('basket_lines')
      .insert({ ...key, quantity })
      .onConflict(['basket_id', 'version_id'])
      .merge(['quantity']);
}

export async function emptyBasket(sql: Knex.Transaction, basketId: string): Promise<void> {
  await sql('basket_lines').where({ basket_id: basketId }).delete();
}
