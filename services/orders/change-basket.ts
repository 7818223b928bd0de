import { type Actor, must } from '../access';
import { readFrozen } from '../kits';
import { parse, refused } from '../problem';
import { write } from '../record';
import { basketLines, saveBasketLine } from './baskets';
import { basketOf } from './basket-view';
import { type BasketView, ChangeBasket } from './schemas';

/** Changes how many of a kit are in a basket, or takes it out with 0. Only what is released can be put in. */
export function changeBasket(actor: Actor, input: ChangeBasket): Promise<BasketView> {
  return setLine(actor, input, () => 0);
}

/** Puts so many more of a kit into a basket. */
export function addToBasket(actor: Actor, input: ChangeBasket): Promise<BasketView> {
  return setLine(actor, input, (before) => before);
}

const most = ChangeBasket.shape.quantity.maxValue ?? 500;

async function setLine(actor: Actor, input: ChangeBasket, kept: (before: number) => number): Promise<BasketView> {
  must(actor, 'basket.change');
  const { basketId, versionId, quantity } = parse(ChangeBasket, input);

  // A basket is nobody's state but its holder's, so that it leaves no line in the record of changes.
  return write(actor, async (tx) => {
    if (quantity > 0) {
      const { state, letter } = await readFrozen(tx.sql, versionId);
      if (state !== 'released') {
        throw refused(`Version ${letter} is not on sale. Look in the catalogue for the version that is.`);
      }
    }
    const before = (await basketLines(tx.sql, basketId)).find((line) => line.versionId === versionId);
    const next = Math.min(most, quantity + kept(before?.quantity ?? 0));
    await saveBasketLine(tx.sql, { basketId, versionId, quantity: next, at: tx.now });
    return basketOf(tx.sql, basketId);
  });
}
