import { copyFileSync } from 'node:fs';
import { afterEach, expect, it } from 'vitest';
import { openDatabase, setDatabase } from '@/db/client';
import { type Actor, systemActor } from '@/services/access';
import { PersonId, newId } from '@/services/ids';
import * as people from '@/services/people';
import { record, write } from '@/services/record';
import { testDatabase } from '@/test/builders/database';

const db = testDatabase();
const command = systemActor('command');
const maud: Actor = { kind: 'staff', id: PersonId.parse(newId()), name: 'Maud Orrin', email: '', roles: ['owner'] };

afterEach(() => setDatabase(db.sql));

async function addLines(count: number): Promise<void> {
  await write(maud, async (tx) => {
    for (let line = 0; line < count; line++) {
      await record(tx, 'price.set', {
        subject: { kind: 'kit', id: `kit-${line}` },
        before: null,
        after: { minor: line },
      });
    }
  });
}

/** A copy in which somebody with the file in hand has changed what no door would let them. */
async function tampered(statements: readonly string[]): Promise<Awaited<ReturnType<typeof people.verifyChanges>>> {
  await db.sql.raw('pragma wal_checkpoint(truncate)');
  const filename = `${db.filename}.${newId()}`;
  copyFileSync(db.filename, filename);
  const copy = openDatabase(filename);
  for (const deed of ['update', 'delete']) await copy.raw(`drop trigger changes_no_${deed}`);
  for (const statement of statements) await copy.raw(statement);
  setDatabase(copy);
  const report = await people.verifyChanges(command);
  await copy.destroy();
  return report;
}

it('the record holds line by line, and the check says how many and where it ends', async () => {
  await addLines(2500);
  const report = await people.verifyChanges(command);
  const last = await db.sql('changes').orderBy('seq', 'desc').first<{ seq: number; hash: string }>('seq', 'hash');
  expect(report).toEqual({ holds: true, lines: last?.seq, head: last?.hash });
});

it.each<[string, string[], number]>([
  ['one byte', [`update changes set after = replace(after, '1700', '1701') where subject_id = 'kit-1700'`], 1701],
  ['who did it', [`update changes set actor_name = 'Nobody' where seq = 40`], 40],
  ['when it was done', ['update changes set at = at + 1 where seq = 1'], 1],
  ['the reason', [`update changes set reason = '' where seq = 7`], 7],
  ['a seal', [`update changes set hash = 'x' where seq = 3`], 3],
  ['the number of lines, one being taken out,', ['delete from changes where seq = 1200'], 1201],
  ['the beginning', ['delete from changes where seq = 1'], 2],
  [
    'the order of two lines',
    ['update changes set seq = seq - 17 where seq in (8, 9)', 'update changes set seq = -seq where seq < 0'],
    8,
  ],
])('the check names the line when %s was changed', async (_what, statements, seq) => {
  expect(await tampered(statements)).toMatchObject({ holds: false, seq });
});

it('a line that was written cannot be changed or removed through any connection', async () => {
  await addLines(1);
  const before = await db.sql('changes').select();
  for (const sql of [db.sql, db.openAnother()]) {
    await expect(sql('changes').where({ seq: 1 }).update({ reason: 'better so' })).rejects.toThrow(/append-only/);
    await expect(sql('changes').where({ seq: 1 }).delete()).rejects.toThrow(/append-only/);
    await expect(sql('changes').delete()).rejects.toThrow(/append-only/);
  }
  expect(await db.sql('changes').select()).toEqual(before);
});

it('money that came and went, movements of stock and invoices are append-only too', async () => {
  const triggers = await db
    .sql('sqlite_master')
    .where({ type: 'trigger' })
    .andWhere('name', 'like', '%_no_%')
    .select<{ name: string }[]>('name');
  const names = triggers.map((trigger) => trigger.name);
  for (const table of ['changes', 'movements', 'order_money', 'invoices', 'sign_offs', 'version_editors']) {
    expect(names).toEqual(expect.arrayContaining([`${table}_no_update`, `${table}_no_delete`]));
  }
});

it('the owner reads it newest first, page by page without a gap, and of one thing alone', async () => {
  const seen: number[] = [];
  let before: number | null = null;
  for (;;) {
    const page = await people.listChanges(maud, before === null ? {} : { before });
    seen.push(...page.changes.map((change) => change.seq));
    before = page.older;
    if (before === null) break;
  }
  const { count = 0 } = (await db.sql('changes').count<{ count: number }[]>({ count: '*' }))[0] ?? {};
  expect(seen).toEqual(Array.from({ length: Number(count) }, (_, index) => Number(count) - index));
  const one = await people.listChanges(maud, { subjectKind: 'kit', subjectId: 'kit-1700' });
  expect(one.changes.map((change) => change.subject.id)).toEqual(['kit-1700']);
});
