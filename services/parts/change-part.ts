import { type Actor, must } from '../access';
import { conflict, parse, refused } from '../problem';
import { type Tx, record, write } from '../record';
import { type Part, type StockedRow, getPart, selectStocked, stockOf, updatePart } from './rows';
import { ChangePart, type PartView, RetirePart } from './schemas';
import { viewOf } from './views';

/**
 * Changes a part's name, cost, mass or values. Drafts that use it show the new verdict at once, since they read the part
 * as it stands; frozen versions keep the values they were sent with.
 */
export async function changePart(actor: Actor, input: ChangePart): Promise<PartView> {
  must(actor, 'part.edit');
  const { partId, basedOn, ...next } = parse(ChangePart, input);
  return write(actor, async (tx) => {
    const before = await getPart(tx.sql, partId);
    if (before.values.kind !== next.values.kind) {
      throw refused('A part keeps its kind. Retire this one and add another.');
    }
    return save(tx, 'part.changed', before, { ...before, ...next, saveNo: basedOn + 1 }, basedOn);
  });
}

/** Takes a part out of use, or back into it. Versions that name it keep it. */
export async function retirePart(actor: Actor, input: RetirePart): Promise<PartView> {
  must(actor, 'part.edit');
  const { partId, basedOn, retired } = parse(RetirePart, input);
  return write(actor, async (tx) => {
    const before = await getPart(tx.sql, partId);
    const after = { ...before, retiredAt: retired ? tx.now : null, saveNo: basedOn + 1 };
    return save(tx, retired ? 'part.retired' : 'part.returned', before, after, basedOn);
  });
}

async function save(tx: Tx, action: string, before: Part, after: Part, basedOn: number): Promise<PartView> {
  const row: StockedRow | undefined = await selectStocked(tx.sql).where('parts.id', after.id).first();
  const stock = row ? stockOf(row) : { onHand: 0, available: 0 };
  if (!(await updatePart(tx.sql, after, basedOn))) {
    throw conflict('Somebody changed this part meanwhile. Read what changed, then save again.', viewOf(before, stock));
  }
  await record(tx, action, { subject: { kind: 'part', id: after.id }, before, after });
  return viewOf(after, stock);
}
