import type { Tx } from '../record';
import { countInWindow } from './attempts';
import { allowance } from './rules';
import { blind } from './secrets';

/** Step: counts an order against what one network address may place in an hour, since each sets stock aside. */
export const countOrder = (tx: Tx, address: string): Promise<void> =>
  countInWindow(tx, `order-from:${blind(address)}`, allowance.orderFromAddress);
