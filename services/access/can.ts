import { forbidden } from '../problem';
import { type Actor, type Role, hasRole, personIdOf } from './actor';

/** What a rule may look at besides the actor; each deed hands in what it knows. */
export interface Owned {
  /** Everybody who ever edited the version. */
  editorIds?: readonly string[];
  /** The customer an order belongs to; null for a guest's order. */
  customerId?: string | null;
  /** The reader holds the order's long link. */
  holdsLink?: boolean;
}

type Rule = (actor: Actor, owned: Owned) => boolean;

const anyone: Rule = () => true;
const staff: Rule = (actor) => actor.kind === 'staff';
const signedIn: Rule = (actor) => actor.kind === 'staff' || actor.kind === 'customer';
const role =
  (...allowed: Role[]): Rule =>
  (actor) =>
    allowed.some((one) => hasRole(actor, one));
const system =
  (...names: string[]): Rule =>
  (actor) =>
    actor.kind === 'system' && names.includes(actor.name);
const either =
  (...rules: Rule[]): Rule =>
  (actor, owned) =>
    rules.some((rule) => rule(actor, owned));

/** A checker who neither drew nor edited it: the rule follows the person, not the role. */
const checkerOfOthersWork: Rule = (actor, owned) => {
  const id = personIdOf(actor);
  return hasRole(actor, 'checker') && id !== null && !(owned.editorIds ?? []).includes(id);
};

const ownOrder: Rule = (actor, owned) => {
  const id = personIdOf(actor);
  return owned.holdsLink === true || (id !== null && owned.customerId === id);
};

/**
 * The one table of who may do what. A page asks `can` to hide a button; every deed and read calls `must` first,
 * and again with the record where ownership counts.
 */
const table = {
  'account.create': anyone,
  'account.sign-in': anyone,
  'account.read-own': signedIn,
  'account.change-own': signedIn,
  'person.list': role('owner'),
  'person.invite': role('owner'),
  'person.change-roles': role('owner'),
  'invitation.accept': anyone,
  'first-owner.create': system('command'),
  'record.read': role('owner'),
  'record.verify': either(role('owner'), system('command')),

  'part.read': staff,
  'part.edit': role('designer', 'owner'),

  'kit.read-all': staff,
  'kit.create': role('designer', 'owner'),
  'version.read': staff,
  'version.edit': role('designer', 'owner'),
  'version.send-to-check': role('designer', 'owner'),
  'version.check': role('checker'),
  'version.hold': checkerOfOthersWork,
  'version.release': checkerOfOthersWork,
  'version.withdraw': role('owner'),
  'evaluation.run': anyone,

  'price.set': role('owner'),
  'delivery.set': role('owner'),
  'catalogue.read': anyone,
  'basket.change': anyone,
  'order.place': anyone,
  'order.read': either(ownOrder, role('owner')),
  'order.pay': ownOrder,
  'order.cancel': either(ownOrder, role('owner')),
  'order.claim': signedIn,
  'order.list-own': signedIn,
  'order.list': role('owner'),
  'order.mark-paid': system('stripe', 'worker'),
  'order.lapse': system('stripe', 'worker'),
  'payment.reconcile': system('worker'),

  'stock.read': staff,
  'stock.receive': role('packer', 'owner'),
  'stock.block': role('checker'),

  'box.list': role('packer', 'owner'),
  'box.prepare': either(role('packer', 'owner'), system('worker', 'command')),
  'box.pack': role('packer'),
  'box.trace': role('packer', 'checker', 'owner', 'designer'),
  'order.ship': role('packer'),

  'paper.guide': either(ownOrder, staff),
  'paper.slip': role('packer', 'owner'),
  'paper.label': role('packer', 'owner'),
  'paper.invoice': either(ownOrder, role('owner')),

  'desk.read': role('owner'),
  'mail.send': system('worker'),
  'outbox.work': system('worker'),
  'demo.sign-in': anyone,
} satisfies Record<string, Rule>;

export type Deed = keyof typeof table;
export const deeds = Object.keys(table) as Deed[]; // the keys of the table above, which `satisfies` keeps exact

const sentences: Partial<Record<Deed, string>> = {
  'version.release': 'Only a checker who has not worked on this version can release it. Ask another checker.',
  'version.hold': 'Only a checker who has not worked on this version can hold it. Ask another checker.',
  'version.edit': 'Only a designer can change a version.',
  'version.send-to-check': 'Only a designer can send a version to check.',
  'box.pack': 'Only a packer can pack a box. Ask the owner for the role.',
  'order.read':
    'This order belongs to somebody else. Sign in with the address it was ordered with, or open the link in your e-mail.',
  'order.list-own': 'Sign in to see your orders. A guest order opens from the link in its e-mail.',
};

export function can(actor: Actor, deed: Deed, owned: Owned = {}): boolean {
  const rule: Rule = table[deed];
  return rule(actor, owned);
}

export function must(actor: Actor, deed: Deed, owned: Owned = {}): void {
  if (!can(actor, deed, owned)) {
    throw forbidden(sentences[deed] ?? 'Your roles do not include this. Ask the owner if you need it for your work.');
  }
}
