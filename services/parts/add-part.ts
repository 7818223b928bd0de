import { type Actor, must } from '../access';
import { PartId, newId } from '../ids';
import { invalid, parse } from '../problem';
import { record, write } from '../record';
import { type Part, insertPart } from './rows';
import { NewPart, type PartView, partKinds } from './schemas';
import { viewOf } from './views';

/** Adds a part to the catalogue. Its code is its name for good and is never used again. */
export async function addPart(actor: Actor, input: NewPart): Promise<PartView> {
  must(actor, 'part.edit');
  const { code, name, massMilligrams, cost, note, values } = parse(NewPart, input);
  const part: Part = {
    id: PartId.parse(newId()),
    code,
    name,
    unit: partKinds[values.kind].unit,
    massMilligrams,
    values,
    cost,
    note,
    saveNo: 1,
    retiredAt: null,
  };
  return write(actor, async (tx) => {
    const taken = await tx.sql('parts').select('id').where({ code }).first<{ id: string } | undefined>();
    if (taken) {
      throw invalid(`${code} is in use already.`, { code: `${code} is in use already. Choose another code.` });
    }
    await insertPart(tx.sql, part, tx.now);
    await record(tx, 'part.added', { subject: { kind: 'part', id: part.id }, after: part });
    return viewOf(part, { onHand: 0, available: 0 });
  });
}
