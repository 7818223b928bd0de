import { beforeAll, describe, expect, it } from 'vitest';
import { systemActor } from '@/services/access';
import {
  callBack,
  hold,
  listDecided,
  readQueue,
  readSheet,
  readSignOff,
  release,
  sendToCheck,
  withdraw,
} from '@/services/check';
import {
  frozenContent,
  currentRelease,
  readVersion,
  readVersionForMail,
  saveCircuit,
  startVersion,
} from '@/services/kits';
import { findingKey, notesIn } from '@/services/kits/rules';
import { changePart, readPart, retirePart } from '@/services/parts';
import { testDatabase } from '../../builders/database';
import { problemOf } from '../../builders/problems';
import { aVersion, addSomeParts, partIdOf, someStaff } from '../../builders/versions';

const db = testDatabase();
type Staff = Awaited<ReturnType<typeof someStaff>>;
let isolde: Staff;
let walter: Staff;
let both: Staff;
let owner: Staff;

beforeAll(async () => {
  isolde = await someStaff(db.sql, 'Isolde Hark', ['designer']);
  walter = await someStaff(db.sql, 'Walter Tarrow', ['checker']);
  both = await someStaff(db.sql, 'Piers Lindow', ['designer', 'checker']);
  owner = await someStaff(db.sql, 'Maud Orrin', ['owner', 'checker', 'designer']);
  await addSomeParts(isolde);
});

const sent = async (version = aVersion(), by = isolde) => {
  const { view, kitId } = await version.saved(by);
  return { kitId, view: await sendToCheck(by, { versionId: view.id, basedOn: view.saveNo }) };
};

/** Everything a checker would write: a reason for each note. */
const signed = async (checker: Staff, versionId: string) => {
  const sheet = await readSheet(checker, versionId);
  const reasons = Object.fromEntries(
    notesIn(sheet.findings).map((note) => [findingKey(note), 'Looked at, and right for this kit.']),
  );
  return { versionId: sheet.versionId, contentHash: sheet.contentHash, reasons, remark: '' };
};

const remark = 'The low end is out of reach. More turns, please.';

describe('sending to check', () => {
  it('freezes the content under its hash and stores the verdict of the server', async () => {
    const { view } = await sent();
    expect(view.state).toBe('in-check');
    expect(view.contentHash).toMatch(/^[0-9a-f]{64}$/);
    const row = await db.sql('versions').where({ id: view.id }).first<{ verdict: string }>();
    expect(JSON.parse(row.verdict)).toMatchObject({ seed: 1, boxes: 20_000, outcome: 'clears' });
  });

  it('gives equal content an equal hash, whoever drew it and whenever', async () => {
    const one = await sent();
    const content = (await frozenContent(db.sql, one.view.id)).content;
    const again = await frozenContent(db.sql, one.view.id);
    expect(again).toEqual({ content, contentHash: one.view.contentHash, state: 'in-check' });
  });

  it('is refused while a place is empty', async () => {
    const { view } = await aVersion().without('D1').saved(isolde);
    const problem = await problemOf(sendToCheck(isolde, { versionId: view.id, basedOn: view.saveNo }));
    expect(problem.kind).toBe('refused');
    expect(problem.message).toContain('Choose a detector.');
  });

  it('is refused when somebody saved it after the sender last read it', async () => {
    const { view } = await aVersion().saved(isolde);
    const circuit = { ...view.content.circuit, coupling: 'direct' as const };
    await saveCircuit(both, { versionId: view.id, circuit, basedOn: view.saveNo });
    expect((await problemOf(sendToCheck(isolde, { versionId: view.id, basedOn: view.saveNo }))).kind).toBe('conflict');
  });

  it('is refused for a part that was retired meanwhile', async () => {
    const { view } = await aVersion().saved(isolde);
    const part = await readPart(isolde, await partIdOf(isolde, 'G-5'));
    const retired = await retirePart(isolde, { partId: part.id, basedOn: part.saveNo, retired: true });
    const problem = await problemOf(sendToCheck(isolde, { versionId: view.id, basedOn: view.saveNo }));
    expect(problem.message).toContain('G-5 is retired');
    await retirePart(isolde, { partId: part.id, basedOn: retired.saveNo, retired: false });
  });

  it('keeps the values the version was sent with when a part changes later', async () => {
    const { view } = await sent();
    const part = await readPart(isolde, await partIdOf(isolde, 'E-HM'));
    const { id, saveNo, name, massMilligrams, cost, note, values } = part;
    await changePart(isolde, {
      partId: id,
      basedOn: saveNo,
      name: 'Headset, another make',
      massMilligrams,
      cost,
      note,
      values,
    });
    const after = await readVersion(isolde, view.id);
    expect(after.content).toEqual(view.content);
    expect(after.lines.find((line) => line.reference === 'E1')?.part?.name).toBe('Headset, high impedance');
    const now = await readPart(isolde, id);
    await changePart(isolde, { partId: id, basedOn: now.saveNo, name, massMilligrams, cost, note, values });
  });

  it('can be called back until somebody has judged it', async () => {
    const { view } = await sent();
    const back = await callBack(isolde, { versionId: view.id });
    expect(back).toMatchObject({ state: 'draft', contentHash: null });
    const again = await sendToCheck(isolde, { versionId: view.id, basedOn: back.saveNo });
    await hold(walter, { versionId: again.id, contentHash: again.contentHash ?? '', remark });
    expect((await problemOf(callBack(isolde, { versionId: view.id }))).kind).toBe('refused');
  });
});

describe('the queue', () => {
  it('shows what waits, the one sent first first, and marks own work', async () => {
    const first = await sent(aVersion(), both);
    const second = await sent();
    const { waiting } = await readQueue(both);
    const ids = waiting.map((entry) => entry.versionId);
    expect(ids.indexOf(first.view.id)).toBeLessThan(ids.indexOf(second.view.id));
    expect(waiting.find((entry) => entry.versionId === first.view.id)?.own).toBe(true);
    expect(waiting.find((entry) => entry.versionId === second.view.id)?.own).toBe(false);
  });

  it('is for checkers', async () => {
    expect((await problemOf(readQueue(isolde))).kind).toBe('forbidden');
  });
});

describe('the check sheet', () => {
  it('lists stops first, then notes, and what clears with its figure', async () => {
    const { view } = await sent(aVersion().withTurns(40).withPart('E1', 'E-32'));
    const sheet = await readSheet(walter, view.id);
    const severities = sheet.findings.map((finding) => finding.severity);
    expect(severities.lastIndexOf('stop')).toBeLessThan(severities.concat('note').indexOf('note'));
    expect(sheet.findings.map((finding) => finding.code)).toEqual(expect.arrayContaining(['BAND-LOW', 'PHONE-Z']));
    expect(sheet.cleared.map((one) => one.title)).toContain('Guide follows the parts');
    expect(sheet.cleared.map((one) => one.code)).not.toContain('BAND-LOW');
  });

  it('says what differs from the version it was started from', async () => {
    const { view, kitId } = await sent(aVersion().withTurns(40));
    const { versionId } = await startVersion(isolde, { kitId, fromVersionId: view.id });
    const draft = await readVersion(isolde, versionId);
    const circuit = { ...draft.content.circuit, winding: { ...draft.content.circuit.winding, turns: 72 } };
    const saved = await saveCircuit(isolde, { versionId, circuit, basedOn: draft.saveNo });
    await sendToCheck(isolde, { versionId, basedOn: saved.saveNo });
    const sheet = await readSheet(walter, versionId);
    expect(sheet.basedOn).toEqual({ letter: 'A', differences: [{ what: 'turns', from: '40', to: '72' }] });
  });
});

it('a draft has no check sheet yet', async () => {
  const { view } = await aVersion().saved(isolde);
  expect((await problemOf(readSheet(walter, view.id))).kind).toBe('missing');
});

describe('holding', () => {
  it('sends the version back with its findings; the next version shows them and what it did about them', async () => {
    const { view, kitId } = await sent(aVersion().withTurns(40));
    const held = await hold(walter, { versionId: view.id, contentHash: view.contentHash ?? '', remark });
    expect(held).toMatchObject({ state: 'held', held: { by: 'Walter Tarrow', remark, changes: [] } });
    const { versionId } = await startVersion(isolde, { kitId, fromVersionId: view.id });
    const draft = await readVersion(isolde, versionId);
    expect(draft.held?.letter).toBe('A');
    expect(draft.held?.findings.map((finding) => finding.code)).toContain('BAND-LOW');
    const circuit = { ...draft.content.circuit, winding: { ...draft.content.circuit.winding, turns: 72 } };
    const mended = await saveCircuit(isolde, { versionId, circuit, basedOn: draft.saveNo });
    expect(mended.held?.changes).toEqual([{ what: 'turns', from: '40', to: '72' }]);
  });

  it('needs a remark', async () => {
    const { view } = await sent();
    const problem = await problemOf(
      hold(walter, { versionId: view.id, contentHash: view.contentHash ?? '', remark: 'no' }),
    );
    expect(problem.fields).toHaveProperty('remark');
  });

  it('writes to everybody who worked on it, once', async () => {
    const { view } = await sent();
    await hold(walter, { versionId: view.id, contentHash: view.contentHash ?? '', remark });
    const jobs = await db.sql('outbox').whereLike('key', `%${view.id}`);
    expect(jobs.map((job: { key: string }) => job.key)).toEqual([`version-held:${view.id}`]);
    expect(await readVersionForMail(systemActor('worker'), view.id)).toMatchObject({
      letter: 'A',
      remark,
      recipients: [{ name: 'Isolde Hark', email: isolde.email }],
    });
  });
});

describe('releasing', () => {
  it('signs the content hash with engine, rules and reasons, and makes the version the one on sale', async () => {
    const { view, kitId } = await sent();
    const released = await release(walter, await signed(walter, view.id));
    expect(released.state).toBe('released');
    expect(await currentRelease(db.sql, kitId)).toEqual({ versionId: view.id, letter: 'A' });
    const signOff = await readSignOff(db.sql, view.id);
    expect(signOff).toMatchObject({ by: 'Walter Tarrow', contentHash: view.contentHash });
    expect(signOff?.verdict.boxes).toBe(20_000);
    expect((await listDecided(isolde, 'released')).map((entry) => entry.versionId)).toContain(view.id);
  });

  it('is in the record of changes with who, before and after', async () => {
    const { view } = await sent();
    await release(walter, await signed(walter, view.id));
    const row = await db.sql('changes').where({ subject_id: view.id, action: 'version.released' }).first();
    expect(row).toMatchObject({ actor_name: 'Walter Tarrow', before: '{"state":"in-check"}' });
  });

  it('asks for a reason for every note', async () => {
    const { view } = await sent();
    const asked = await signed(walter, view.id);
    const [key] = Object.keys(asked.reasons);
    if (key === undefined) throw new Error('This version should carry a note, since none of its parts was measured.');
    const problem = await problemOf(release(walter, { ...asked, reasons: { ...asked.reasons, [key]: ' ' } }));
    expect(problem.kind).toBe('refused');
    expect(problem.message).toContain('no reason yet');
    expect((await readVersion(isolde, view.id)).state).toBe('in-check');
  });

  it('is done once, also when two checkers press at the same moment', async () => {
    const { view } = await sent();
    const asked = await signed(walter, view.id);
    const results = await Promise.allSettled([release(walter, asked), release(both, asked)]);
    expect(results.map((result) => result.status).sort()).toEqual(['fulfilled', 'rejected']);
    expect((await problemOf(release(walter, asked))).message).toContain('It is released already.');
    expect(await db.sql('sign_offs').where({ version_id: view.id })).toHaveLength(1);
  });

  it('is refused under a hash that is not the one in check', async () => {
    const { view } = await sent();
    const asked = await signed(walter, view.id);
    const problem = await problemOf(release(walter, { ...asked, contentHash: 'a'.repeat(64) }));
    expect(problem.message).toContain('Open the sheet again');
  });

  it('is refused for a draft and for a held version', async () => {
    const { view } = await aVersion().saved(isolde);
    const asked = { versionId: view.id, contentHash: 'a'.repeat(64), reasons: {}, remark: '' };
    expect((await problemOf(release(walter, asked))).message).toContain('still a draft');
    const { view: other } = await sent();
    const sheet = await signed(walter, other.id);
    await hold(walter, { versionId: other.id, contentHash: sheet.contentHash, remark });
    expect((await problemOf(release(walter, sheet))).message).toContain('It is held already');
  });
});

describe('withdrawing', () => {
  it('is for the owner, of a released version, with a reason', async () => {
    const { view, kitId } = await sent();
    const asked = { versionId: view.id, reason: 'The capacitor is no longer made.' };
    expect((await problemOf(withdraw(owner, asked))).kind).toBe('refused');
    await release(walter, await signed(walter, view.id));
    expect((await problemOf(withdraw(walter, asked))).kind).toBe('forbidden');
    expect((await withdraw(owner, asked)).state).toBe('withdrawn');
    expect(await currentRelease(db.sql, kitId)).toBeNull();
  });
});
