import * as stock from '@/services/stock';
import { demoParts } from './parts';
import type { PartIds } from './fill-bench';
import { as, dice, goTo } from './yard';

const suppliers = [
  'Cantred Components',
  'Osk Wire Works',
  'Ferry Lane Supplies',
  'Millrace Hardware',
  'Downs Acoustic',
];

/** Two deliveries of most parts, one bin each; a lot in quarantine here and there waits for its inspection. */
export async function fillStore(ids: PartIds): Promise<void> {
  const roll = dice(48);
  const packer = as('Bryn Orne');
  for (const [index, part] of demoParts.entries()) {
    const partId = ids.get(part.code);
    if (!partId || part.values.kind === 'print') continue;
    const aisle = 'ABCDEF'.charAt(Math.floor(index / 25));
    const isWire = part.values.kind === 'wire';
    for (const delivery of [1, 2]) {
      goTo(delivery === 1 ? 2 : 20, 8, index % 60);
      const pieces = (delivery === 1 ? 60 : 40) + roll(80);
      const quantity = isWire
        ? pieces * 15_000
        : ['hardware', 'packaging'].includes(part.values.kind)
          ? pieces * 12
          : pieces;
      await stock.receiveLot(packer, {
        partId,
        lotCode: `L${delivery}${String(index + 1).padStart(3, '0')}-${part.code.slice(0, 12)}`,
        supplier: suppliers[roll(suppliers.length)] ?? 'Cantred Components',
        binCode: `${aisle}-${String((index % 25) * 2 + delivery).padStart(2, '0')}`,
        quantity,
        unitCostMinor: part.cost.minor,
        accepted: !(delivery === 2 && index % 17 === 3),
      });
    }
  }
}
