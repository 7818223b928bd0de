import { afterEach, beforeAll, beforeEach, expect, it } from 'vitest';
import { systemActor, visitor } from '@/services/access';
import * as people from '@/services/people';
import { codeAt } from '@/services/people/second-factor';
import { Problem } from '@/services/problem';
import { setClock } from '@/services/record';
import { days, minutes } from '@/services/time';
import { testDatabase } from '@/test/builders/database';
import { type Known, aCustomer, aStaffMember, codeOf, command, passwords, signIn } from './people';

const db = testDatabase();
const worker = systemActor('worker');
let owner: Known;

let clock = Date.parse('2026-12-01T09:00:00Z');
beforeAll(async () => {
  owner = await aStaffMember('Maud Orrin', ['owner']);
});
beforeEach(() => {
  clock += minutes(60);
  setClock(() => clock);
});
afterEach(() => setClock(undefined));

const freshCode = () => {
  clock += 60_000;
  return codeOf(owner, clock);
};

/** Invites as the owner and takes the link out of the mail that the worker would send. */
async function invited(email: string, name = 'Tilda Marsh'): Promise<string> {
  await people.inviteStaff(owner.actor, { name, email, roles: ['packer'], code: freshCode() });
  return newestInvitation(email);
}

async function newestInvitation(email: string): Promise<string> {
  const row = await db.sql('invitations').where({ email }).orderBy('created_at', 'desc').first<{ id: string }>('id');
  const view = await people.readInvitationForMail(worker, row?.id ?? '');
  return new URL(view?.link ?? '').pathname.split('/').at(-1) ?? '';
}

async function accept(token: string, password = 'ferry-3-lamp'): Promise<{ secret: string; email: string }> {
  const { secret } = await people.readInvitation(visitor, token);
  const { email } = await people.acceptInvitation(visitor, { token, password, code: codeAt(secret, clock) });
  return { secret, email };
}

it('somebody invited sets password and second factor, and signs in with both', async () => {
  const token = await invited('tilda@yard.example');
  const { secret, email } = await accept(token);
  clock += 30_000;
  await expect(signIn(email, 'ferry-3-lamp', codeAt(secret, clock))).resolves.toBeTruthy();
  const { staff, invitations } = await people.listPeople(owner.actor);
  expect(staff.find((person) => person.email === email)).toMatchObject({ name: 'Tilda Marsh', roles: ['packer'] });
  expect(invitations.map((invitation) => invitation.email)).not.toContain(email);
});

it('an invitation is accepted once, also when two browsers try at the same moment', async () => {
  const token = await invited('once@yard.example');
  const answers = await Promise.all(
    [1, 2].map(() =>
      accept(token).then(
        () => 'in',
        () => 'out',
      ),
    ),
  );
  expect(answers.sort()).toEqual(['in', 'out']);
  await expect(people.readInvitation(visitor, token)).rejects.toThrow(/used or older than a week/);
});

it('an invitation is over after a week, and a newer one takes its place', async () => {
  const first = await invited('late@yard.example');
  const second = await invited('late@yard.example');
  await expect(people.readInvitation(visitor, first)).rejects.toThrow(/used or older/);
  await expect(people.readInvitation(visitor, second)).resolves.toMatchObject({ email: 'late@yard.example' });
  clock += days(7);
  await expect(people.readInvitation(visitor, second)).rejects.toThrow(/used or older/);
});

it('the page of an invitation shows the same second factor at each look, as letters and as squares', async () => {
  const token = await invited('twice@yard.example');
  const first = await people.readInvitation(visitor, token);
  const second = await people.readInvitation(visitor, token);
  expect(first).toEqual(second);
  expect(first.secret).toMatch(/^[A-Z2-7]{32}$/);
  expect(first.uri).toContain(`secret=${first.secret}`);
  expect(first.qr.path).toMatch(/^(M\d+ \d+h1v1h-1z)+$/);
});

it('a wrong first code or a weak password leaves the invitation open', async () => {
  const token = await invited('slow@yard.example');
  const { secret } = await people.readInvitation(visitor, token);
  const attempt = (password: string, code: string) => people.acceptInvitation(visitor, { token, password, code });
  const stale = codeAt(secret, clock - minutes(5));
  await expect(attempt('ferry-3-lamp', stale)).rejects.toMatchObject({ fields: { code: expect.any(String) } });
  await expect(attempt('packer12', codeAt(secret, clock))).rejects.toMatchObject({ kind: 'invalid' });
  await expect(attempt('ferry-3-lamp', codeAt(secret, clock))).resolves.toBeTruthy();
});

it('the second factor lies sealed, and its seal opens for its own person only', async () => {
  const row = await db.sql('people').where({ id: owner.id }).first<{ totp_secret: string }>('totp_secret');
  expect(row?.totp_secret).not.toContain(owner.secret);
  const thief = await aStaffMember('Bryn Orne', ['packer']);
  await db.sql('people').where({ id: thief.id }).update({ totp_secret: row?.totp_secret });
  await expect(signIn(thief.email, passwords.staff, codeOf(owner, clock))).rejects.toThrow();
});

it('inviting needs a fresh code of the owner, and a used one is refused', async () => {
  const input = { name: 'Bryn Orne', email: 'fresh@yard.example', roles: ['packer' as const] };
  const code = freshCode();
  await expect(people.inviteStaff(owner.actor, { ...input, code: '' })).rejects.toMatchObject({ kind: 'invalid' });
  await people.inviteStaff(owner.actor, { ...input, code });
  await expect(people.inviteStaff(owner.actor, { ...input, code })).rejects.toMatchObject({ kind: 'invalid' });
});

it('only the owner invites, lists people and changes roles', async () => {
  const bryn = await aStaffMember('Bryn Orne', ['packer', 'checker', 'designer']);
  const edda = await aCustomer('Edda Holm');
  const change = { personId: bryn.id, roles: ['owner' as const], disabled: false, code: '' };
  for (const actor of [bryn.actor, edda.actor, visitor, worker]) {
    const invite = { name: 'X', email: 'x@yard.example', roles: ['owner' as const], code: '' };
    await expect(people.inviteStaff(actor, invite)).rejects.toMatchObject({ kind: 'forbidden' });
    await expect(people.listPeople(actor)).rejects.toMatchObject({ kind: 'forbidden' });
    await expect(people.changeRoles(actor, change)).rejects.toMatchObject({ kind: 'forbidden' });
    await expect(people.listChanges(actor, {})).rejects.toMatchObject({ kind: 'forbidden' });
  }
});

it('a customer is not turned into staff, by invitation or by roles', async () => {
  const edda = await aCustomer('Edda Holm');
  const invite = { name: 'Edda Holm', email: edda.email, roles: ['packer' as const], code: freshCode() };
  await expect(people.inviteStaff(owner.actor, invite)).rejects.toThrow(/customer uses this address/);
  const change = { personId: edda.id, roles: ['packer' as const], disabled: false, code: freshCode() };
  await expect(people.changeRoles(owner.actor, change)).rejects.toThrow(/Only staff have roles/);
});

it('new roles are recorded with before and after, told by mail, and count at once', async () => {
  const bryn = await aStaffMember('Bryn Orne', ['packer']);
  const change = {
    personId: bryn.id,
    roles: ['packer' as const, 'checker' as const],
    disabled: false,
    code: freshCode(),
  };
  await expect(people.changeRoles(owner.actor, change)).resolves.toMatchObject({ roles: ['checker', 'packer'] });
  const { changes } = await people.listChanges(owner.actor, { subjectKind: 'person', subjectId: bryn.id });
  expect(changes[0]).toMatchObject({ action: 'person.roles-changed', who: 'Maud Orrin' });
  expect(JSON.parse(changes[0]?.before ?? '')).toMatchObject({ roles: ['packer'] });
  expect(JSON.parse(changes[0]?.after ?? '')).toMatchObject({ roles: ['checker', 'packer'] });
  expect(await db.sql('outbox').where('key', 'like', `account-changed:roles:${bryn.id}:%`).select('id')).toHaveLength(
    1,
  );
});

it('the last owner stays owner', async () => {
  const change = { personId: owner.id, disabled: false, code: freshCode() };
  await expect(people.changeRoles(owner.actor, { ...change, roles: ['packer'] })).rejects.toThrow(/another owner/);
  const second = await aStaffMember('Piers Lindow', ['owner']);
  clock += 60_000;
  const code = codeOf(second, clock);
  const off = { ...change, roles: ['owner' as const], disabled: true };
  await expect(people.changeRoles(second.actor, { ...off, code })).resolves.toBeTruthy();
  const back = { ...change, roles: ['owner' as const], code: codeOf(second, clock + 30_000) };
  await expect(people.changeRoles(second.actor, back)).resolves.toMatchObject({ disabledAt: null });
});

it('staff who lost their authenticator get a new way in, and the old one ends', async () => {
  const bryn = await aStaffMember('Bryn Orne', ['packer']);
  await people.sendNewWayIn(owner.actor, { personId: bryn.id, code: freshCode() });
  const { secret } = await accept(await newestInvitation(bryn.email), 'harbour 22 sluice');
  clock += 60_000;
  await expect(signIn(bryn.email, passwords.staff, codeOf(bryn, clock))).rejects.toThrow(/does not fit/);
  await expect(signIn(bryn.email, 'harbour 22 sluice', codeAt(secret, clock))).resolves.toEqual({ personId: bryn.id });
});

it('a password changes with the one of now, and a wrong one is told at its field', async () => {
  const edda = await aCustomer('Edda Holm');
  const change = (current: string, next: string) => people.changePassword(edda.actor, { current, next });
  await expect(change('not this one', 'four odd new words')).rejects.toMatchObject({
    fields: { current: expect.stringContaining('not your password') },
  });
  await expect(change(passwords.customer, 'nine char')).rejects.toMatchObject({ fields: { next: expect.any(String) } });
  await expect(change(passwords.customer, passwords.customer)).rejects.toBeInstanceOf(Problem);
  await expect(change(passwords.customer, 'four odd new words')).resolves.toEqual({ email: edda.email });
  await expect(signIn(edda.email, 'four odd new words')).resolves.toBeTruthy();
});

it('the first owner is made by the command alone, and only while there is none', async () => {
  const input = { name: 'Ada Brook', email: 'ada@yard.example', password: passwords.staff };
  await expect(people.createFirstOwner(command, input)).rejects.toThrow(/has an owner/);
  await expect(people.createFirstOwner(owner.actor, input)).rejects.toMatchObject({ kind: 'forbidden' });
  await expect(people.addPerson(visitor, { kind: 'customer', name: 'X', email: 'x@y.example' })).rejects.toMatchObject({
    kind: 'forbidden',
  });
});

it('outside a demo nobody signs in by a button, and the list of demo people is not there', async () => {
  await expect(people.signInDemo(visitor, { personId: owner.id })).rejects.toMatchObject({ kind: 'missing' });
  await expect(people.listDemoPeople(visitor)).rejects.toMatchObject({ kind: 'missing' });
});
