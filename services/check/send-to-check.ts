import { type Actor, must } from '../access';
import { JUDGED, evaluateApart, freezeVersion, readDraft, readVersion, thawVersion } from '../kits';
import type { VersionView } from '../kits/schemas';
import { conflict, parse, refuseIfAny, refused } from '../problem';
import { reading, record, write } from '../record';
import { CallBack, SendToCheck } from './schemas';

/**
 * Freezes a draft under the hash of its content and stores the server's own verdict on it. What the browser worked out
 * is not asked for. Refused while a place is empty, and when the draft moved on since `basedOn`.
 */
export async function sendToCheck(actor: Actor, input: SendToCheck): Promise<VersionView> {
  must(actor, 'version.send-to-check');
  const { versionId, basedOn } = parse(SendToCheck, input);
  const draft = await readDraft(reading(), versionId);
  if (draft.saveNo !== basedOn) throw await changedMeanwhile(actor, versionId);
  refuseIfAny(draft.retired.map((code) => `${code} is retired. Choose another part.`));
  const { verdict } = await evaluateApart(draft.content, JUDGED);

  await write(actor, async (tx) => {
    const again = await readDraft(tx.sql, versionId);
    const frozen =
      again.saveNo === basedOn &&
      (await freezeVersion(tx, { versionId, saveNo: basedOn, content: draft.content, verdict }));
    if (!frozen) throw refused('The version changed while it was evaluated. Read what changed, then send it again.');
    await record(tx, 'version.sent-to-check', {
      subject: { kind: 'version', id: versionId },
      before: { state: 'draft' },
      after: { state: 'in-check', ...frozen, outcome: verdict.outcome },
    });
  });
  return readVersion(actor, versionId);
}

const changedMeanwhile = async (actor: Actor, versionId: string) =>
  conflict('Somebody changed this version meanwhile. Read what changed, then send it again.', {
    version: await readVersion(actor, versionId),
  });

/** Takes a version back to draft while nobody has judged it; the check is cancelled. */
export async function callBack(actor: Actor, input: CallBack): Promise<VersionView> {
  must(actor, 'version.send-to-check');
  const { versionId } = parse(CallBack, input);
  await write(actor, async (tx) => {
    if (!(await thawVersion(tx, versionId))) {
      throw refused('Only a version that waits in check can be called back. Start a new version instead.');
    }
    await record(tx, 'version.called-back', {
      subject: { kind: 'version', id: versionId },
      before: { state: 'in-check' },
      after: { state: 'draft' },
    });
  });
  return readVersion(actor, versionId);
}
