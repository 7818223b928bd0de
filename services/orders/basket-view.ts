import type { Knex } from 'knex';
import { type Actor, must } from '../access';
import { priceSteps } from '../catalogue';
import { cheaperQuantity, shopCurrency, unitPrice } from '../catalogue/rules';
import { readFrozen } from '../kits';
import { money, sum, times } from '../money';
import { reading } from '../record';
import { buildable } from '../stock';
import { basketLines } from './baskets';
import { BasketId, type BasketLine, BasketView } from './schemas';

/** What the holder of the cookie has in the basket; an unknown or absent id is an empty one. */
export async function readBasket(actor: Actor, basketId: string | null): Promise<BasketView> {
  must(actor, 'basket.change');
  const id = BasketId.safeParse(basketId);
  return id.success ? basketOf(reading(), id.data) : { lines: [], count: 0, total: money(0, shopCurrency) };
}

/** How many kits the badge in the bar shows. */
export async function countBasket(actor: Actor, basketId: string | null): Promise<number> {
  must(actor, 'basket.change');
  const id = BasketId.safeParse(basketId);
  if (!id.success) return 0;
  const lines = await basketLines(reading(), id.data);
  return lines.reduce((all, line) => all + line.quantity, 0);
}

export async function basketOf(sql: Knex, basketId: string): Promise<BasketView> {
  const lines: BasketLine[] = [];
  for (const { versionId, quantity } of await basketLines(sql, basketId)) {
    const { content, state, kitId, letter } = await readFrozen(sql, versionId);
    const { code, number, name } = content.kit;
    const steps = (await priceSteps(sql, [kitId])).get(kitId) ?? [];
    const unit = state === 'released' ? unitPrice(steps, quantity) : null;
    const ready = (await buildable(sql, content)).count;
    const trouble =
      state !== 'released'
        ? 'This version is no longer sold. Take it out and look for a newer one.'
        : unit === null
          ? 'This kit has no price yet. Take it out and come back when it has one.'
          : ready < quantity
            ? `${ready === 0 ? 'None' : `Only ${ready}`} can be made just now. Take fewer.`
            : null;
    lines.push({
      versionId,
      code,
      number,
      name,
      letter,
      quantity,
      unit,
      total: unit && times(unit, quantity),
      ready,
      trouble,
      cheaper: unit && cheaperQuantity(steps, quantity),
    });
  }
  return BasketView.parse({
    lines,
    count: lines.reduce((all, line) => all + line.quantity, 0),
    total: sum(
      lines.flatMap((line) => line.total ?? []),
      shopCurrency,
    ),
  });
}
