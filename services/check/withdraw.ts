import { type Actor, must } from '../access';
import { JUDGED, evaluateApart, readFrozen, readVersion, setState } from '../kits';
import type { VersionView } from '../kits/schemas';
import { parse, refused } from '../problem';
import { reading, record, write } from '../record';
import { insertSignOff } from './rows';
import { Withdraw } from './schemas';

/** Takes a released version off sale for good. Old orders go on showing it. */
export async function withdraw(actor: Actor, input: Withdraw): Promise<VersionView> {
  must(actor, 'version.withdraw');
  const { versionId, reason } = parse(Withdraw, input);
  const frozen = await readFrozen(reading(), versionId);
  const { verdict } = await evaluateApart(frozen.content, JUDGED);

  await write(actor, async (tx) => {
    if (!(await setState(tx, versionId, 'released', 'withdrawn'))) {
      throw refused('Only a released version can be withdrawn.');
    }
    await insertSignOff(tx, {
      versionId,
      decision: 'withdrawn',
      contentHash: frozen.contentHash,
      verdict,
      reasons: {},
      remark: reason,
    });
    await record(tx, 'version.withdrawn', {
      subject: { kind: 'version', id: versionId },
      before: { state: 'released' },
      after: { state: 'withdrawn' },
      reason,
    });
  });
  return readVersion(actor, versionId);
}
