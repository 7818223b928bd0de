import { describe, expect, test } from 'vitest';
import { type Actor, can, deeds, systemActor, visitor } from '@/services/access';
import { PersonId } from '@/services/ids';

const id = (letter: string) => PersonId.parse(letter.repeat(26));
const person = (letter: string) => ({ id: id(letter), name: 'Somebody', email: `${letter}@coilyard.example` });
const actors = {
  visitor,
  customer: { kind: 'customer', ...person('c') },
  designer: { kind: 'staff', ...person('d'), roles: ['designer'] },
  checker: { kind: 'staff', ...person('e'), roles: ['checker'] },
  packer: { kind: 'staff', ...person('p'), roles: ['packer'] },
  owner: { kind: 'staff', ...person('w'), roles: ['owner'] },
  stripe: systemActor('stripe'),
  worker: systemActor('worker'),
  command: systemActor('command'),
} satisfies Record<string, Actor>;
type Who = keyof typeof actors;

const people: Who[] = ['visitor', 'customer', 'designer', 'checker', 'packer', 'owner'];
const staff: Who[] = ['designer', 'checker', 'packer', 'owner'];
const all: Who[] = [...people, 'stripe', 'worker', 'command'];

/** Who may, without owning anything: the whole matrix, a line a deed. A deed without a line fails. */
const matrix: Record<string, Who[]> = {
  'account.create': all,
  'account.sign-in': all,
  'account.read-own': ['customer', ...staff],
  'account.change-own': ['customer', ...staff],
  'person.list': ['owner'],
  'person.invite': ['owner'],
  'person.change-roles': ['owner'],
  'invitation.accept': all,
  'first-owner.create': ['command'],
  'record.read': ['owner'],
  'record.verify': ['owner', 'command'],
  'part.read': staff,
  'part.edit': ['designer', 'owner'],
  'kit.read-all': staff,
  'kit.create': ['designer', 'owner'],
  'version.read': staff,
  'version.edit': ['designer', 'owner'],
  'version.send-to-check': ['designer', 'owner'],
  'version.check': ['checker'],
  'version.hold': ['checker'],
  'version.release': ['checker'],
  'version.withdraw': ['owner'],
  'evaluation.run': all,
  'price.set': ['owner'],
  'delivery.set': ['owner'],
  'catalogue.read': all,
  'basket.change': all,
  'order.place': all,
  'order.read': ['owner'],
  'order.pay': [],
  'order.cancel': ['owner'],
  'order.claim': ['customer', ...staff],
  'order.list-own': ['customer', ...staff],
  'order.list': ['owner'],
  'order.mark-paid': ['stripe', 'worker'],
  'order.lapse': ['stripe', 'worker'],
  'payment.reconcile': ['worker'],
  'stock.read': staff,
  'stock.receive': ['packer', 'owner'],
  'stock.block': ['checker'],
  'box.list': ['packer', 'owner'],
  'box.prepare': ['packer', 'owner', 'worker', 'command'],
  'box.pack': ['packer'],
  'box.trace': staff,
  'order.ship': ['packer'],
  'paper.guide': staff,
  'paper.slip': ['packer', 'owner'],
  'paper.label': ['packer', 'owner'],
  'paper.invoice': ['owner'],
  'desk.read': ['owner'],
  'mail.send': ['worker'],
  'outbox.work': ['worker'],
  'demo.sign-in': all,
};

describe('who may do what', () => {
  test.each(deeds)('%s is allowed to those of its line and to nobody else', (deed) => {
    const allowed = matrix[deed];
    expect(allowed, `${deed} has no line in the matrix`).toBeDefined();
    const may = (Object.keys(actors) as Who[]).filter((who) => can(actors[who], deed));
    expect(new Set(may)).toEqual(new Set(allowed));
  });

  test('a checker who edited a version may neither hold nor release it', () => {
    const editorIds = [id('e')];
    expect(can(actors.checker, 'version.release', { editorIds })).toBe(false);
    expect(can(actors.checker, 'version.hold', { editorIds })).toBe(false);
    expect(can(actors.checker, 'version.release', { editorIds: [id('d')] })).toBe(true);
  });

  test('an owner without the checker role may not release anything', () => {
    expect(can(actors.owner, 'version.release', { editorIds: [] })).toBe(false);
  });

  test('a customer reads and pays the own order, and nobody else’s', () => {
    for (const deed of ['order.read', 'order.pay', 'order.cancel'] as const) {
      expect(can(actors.customer, deed, { customerId: id('c') })).toBe(true);
      expect(can(actors.customer, deed, { customerId: id('d') })).toBe(false);
      expect(can(visitor, deed, { customerId: null })).toBe(false);
      expect(can(visitor, deed, { customerId: null, holdsLink: true })).toBe(true);
    }
  });
});
