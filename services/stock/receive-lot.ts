import { type Actor, must, personIdOf } from '../access';
import { LotId, newId } from '../ids';
import { missing, parse, refused } from '../problem';
import { record, type Tx, write } from '../record';
import { ReceiveLot } from './schemas';
import { walkingOrder } from './rules';
import * as rows from './rows';

/** Takes a delivery in: its lot, its bin and the first movement. Refused when the lot code is in use. */
export async function receiveLot(actor: Actor, input: ReceiveLot): Promise<{ lotId: LotId }> {
  must(actor, 'stock.receive');
  const receipt = parse(ReceiveLot, input);

  return write(actor, async (tx) => {
    const part = await rows.findPart(tx.sql, receipt.partId);
    if (!part) throw missing('This part is not in the list. Add it as a part first.');
    const taken = await tx.sql('lots').where({ code: receipt.lotCode }).first<{ id: string }>('id');
    if (taken) throw refused(`Lot ${receipt.lotCode} is in the store already. Give this delivery a code of its own.`);

    const lotId = LotId.parse(newId());
    await tx.sql('lots').insert({
      id: lotId,
      code: receipt.lotCode,
      part_id: part.id,
      supplier: receipt.supplier,
      received_at: tx.now,
      state: receipt.accepted ? 'accepted' : 'quarantine',
      unit_cost_minor: receipt.unitCostMinor,
      measurements: '[]',
    });
    await rows.move(tx.sql, {
      id: newId(),
      at: tx.now,
      partId: part.id,
      lotId,
      binId: await binOf(tx, receipt.binCode),
      quantity: receipt.quantity,
      kind: 'receipt',
      reason: 'received',
      document: `lot ${receipt.lotCode}`,
      personId: personIdOf(actor),
      unitCostMinor: receipt.unitCostMinor,
    });
    await rows.changeStock(tx.sql, part.id, { accepted: receipt.accepted ? receipt.quantity : 0 });
    await record(tx, 'lot.received', {
      subject: { kind: 'lot', id: lotId },
      after: { ...receipt, partCode: part.code },
    });
    return { lotId };
  });
}

async function binOf(tx: Tx, code: string): Promise<string> {
  const known = await tx.sql('bins').where({ code }).first<{ id: string }>('id');
  if (known) return known.id;
  const id = newId();
  await tx.sql('bins').insert({ id, code, position: walkingOrder(code) });
  return id;
}
