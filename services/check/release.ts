import { type Actor, must } from '../access';
import { JUDGED, evaluateApart, readFrozen, readVersion, setState } from '../kits';
import type { VersionView } from '../kits/schemas';
import { queue } from '../mail';
import { parse, refuseIfAny, refused } from '../problem';
import { reading, record, write } from '../record';
import { insertSignOff } from './rows';
import { releaseBlockers } from './rules';
import { Release } from './schemas';

/** Releases a version in check. Refused while a stop stands, to whoever worked on it, and if the content moved on. */
export async function release(actor: Actor, input: Release): Promise<VersionView> {
  must(actor, 'version.check');
  const { versionId, contentHash, reasons, remark } = parse(Release, input);
  const judged = await readFrozen(reading(), versionId);
  must(actor, 'version.release', judged);
  // A second's work: in a thread, and before the lock.
  const { verdict, findings } = await evaluateApart(judged.content, JUDGED);

  await write(actor, async (tx) => {
    const frozen = await readFrozen(tx.sql, versionId);
    must(actor, 'version.release', frozen);
    refuseIfAny(
      releaseBlockers({
        state: frozen.state,
        contentHash: frozen.contentHash,
        readHash: contentHash,
        findings,
        reasons,
      }),
    );
    if (frozen.contentHash !== judged.contentHash)
      throw refused('Its content changed while it was evaluated. Open the sheet again.');
    await insertSignOff(tx, { versionId, decision: 'released', contentHash, verdict, reasons, remark });
    if (!(await setState(tx, versionId, 'in-check', 'released')))
      throw refused('Somebody decided before you. Open the sheet again.');
    await record(tx, 'version.released', {
      subject: { kind: 'version', id: versionId },
      before: { state: 'in-check' },
      after: { state: 'released', contentHash, reasons },
      ...(remark !== '' && { reason: remark }),
    });
    await queue(tx, 'version-released', { versionId }, versionId);
  });
  return readVersion(actor, versionId);
}
