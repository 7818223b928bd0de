import { type Actor, must } from '../access';
import { readFrozen } from '../kits';
import { parse, refused } from '../problem';
import { write } from '../record';
import { saveBasketLine } from './baskets';
import { basketOf } from './basket-view';
import { type BasketView, ChangeBasket } from './schemas';

/** Puts kits into a basket, changes how many, or takes them out with 0. Only what is released can be put in. */
export async function changeBasket(actor: Actor, input: ChangeBasket): Promise<BasketView> {
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
    await saveBasketLine(tx.sql, { basketId, versionId, quantity, at: tx.now });
    return basketOf(tx.sql, basketId);
  });
}
