import { type Actor, must } from '../access';
import { JUDGED, evaluateApart, readFrozen, readVersion, setState } from '../kits';
import type { VersionView } from '../kits/schemas';
import { queue } from '../mail';
import { parse, refuseIfAny, refused } from '../problem';
import { reading, record, write } from '../record';
import { insertSignOff } from './rows';
import { holdBlockers } from './rules';
import { Hold } from './schemas';

/** Holds a version in check and sends it back to its designers with the findings and a remark. */
export async function hold(actor: Actor, input: Hold): Promise<VersionView> {
  must(actor, 'version.check');
  const { versionId, contentHash, remark } = parse(Hold, input);
  const judged = await readFrozen(reading(), versionId);
  must(actor, 'version.hold', judged);
  const { verdict } = await evaluateApart(judged.content, JUDGED);

  await write(actor, async (tx) => {
    const frozen = await readFrozen(tx.sql, versionId);
    must(actor, 'version.hold', frozen);
    refuseIfAny(holdBlockers({ state: frozen.state, contentHash: frozen.contentHash, readHash: contentHash }));
    await insertSignOff(tx, { versionId, decision: 'held', contentHash, verdict, reasons: {}, remark });
    if (!(await setState(tx, versionId, 'in-check', 'held')))
      throw refused('Somebody decided before you. Open the sheet again.');
    await record(tx, 'version.held', {
      subject: { kind: 'version', id: versionId },
      before: { state: 'in-check' },
      after: { state: 'held', contentHash },
      reason: remark,
    });
    await queue(tx, 'version-held', { versionId }, versionId);
  });
  return readVersion(actor, versionId);
}
