import { personIdOf } from '../access';
import { refused } from '../problem';
import type { Tx } from '../record';
import { type BoxRow, getBox, keepClaim } from './rows';
import { takenSentence, barOf } from './rules';

/**
 * A step: the box, when the acting packer has it in hand; each thing done keeps the claim alive. Refused for a closed
 * box, for a box that somebody else took over, and for a version or an order that may no longer be packed.
 * @param emptying what is done takes something out, which such a box needs
 */
export async function boxInHands(tx: Tx, boxId: string, { emptying = false } = {}): Promise<BoxRow> {
  const box = await getBox(tx.sql, boxId);
  const personId = personIdOf(tx.actor);
  if (box.state === 'closed' || box.state === 'shipped') {
    throw refused(`Box ${box.serial} is closed. What is in it can be read under Trace.`);
  }
  if (personId === null || !(await keepClaim(tx, boxId, personId))) {
    throw refused(
      box.claimedBy !== null && box.claimedBy !== personId && box.claimedAt !== null
        ? takenSentence(box.serial, box.claimedName ?? 'Somebody', box.claimedAt)
        : `Take box ${box.serial} first: press "Pack this box".`,
    );
  }
  const bar = barOf(box);
  if (bar !== '' && !emptying) throw refused(bar);
  return box;
}
