import { accountChanged } from '@/templates/mails/account-changed';
import { invitation } from '@/templates/mails/invitation';
import type { Letter } from '@/templates/mails/letter';
import { noLink } from '@/templates/mails/no-link';
import { orderBackordered } from '@/templates/mails/order-backordered';
import { orderConfirmed } from '@/templates/mails/order-confirmed';
import { orderShipped } from '@/templates/mails/order-shipped';
import { signInLink } from '@/templates/mails/sign-in-link';
import { versionHeld } from '@/templates/mails/version-held';
import { versionReleased } from '@/templates/mails/version-released';
import type { VersionMailView } from '@/templates/mails/version-view';
import type { Actor } from '../../access';
import { env } from '../../env';
import { OrderId, VersionId } from '../../ids';
import * as kits from '../../kits';
import { type MailKind, type MailPayload, payloads } from '../../mail';
import * as orders from '../../orders';
import * as people from '../../people';

/** A mail ready to go: to whom, and what it says. */
export interface Mail {
  to: { name: string; email: string };
  letter: Letter;
}

/** Writes the mails of one job from a fresh view; none when what they were about is over. */
type Writer<K extends MailKind> = (actor: Actor, payload: MailPayload<K>) => Promise<Mail[]>;

/** A new mail: its payload in `services/mail/kinds.ts`, its words in `templates/mails`, its line here. */
const writers: { [K in MailKind]: Writer<K> } = {
  'sign-in-link': async (actor, { linkId }) => {
    const view = await people.readLinkForMail(actor, linkId);
    return view ? [{ to: view, letter: signInLink(view) }] : [];
  },
  'no-link': (_actor, { email, reason }) => {
    const link = addressOf(reason === 'staff' ? '/sign-in' : '/join');
    return Promise.resolve([{ to: { name: '', email }, letter: noLink({ reason, link }) }]);
  },
  invitation: async (actor, { invitationId }) => {
    const view = await people.readInvitationForMail(actor, invitationId);
    return view ? [{ to: view, letter: invitation(view) }] : [];
  },
  'account-changed': async (actor, { personId, change }) => {
    const view = await people.readPersonForMail(actor, personId);
    return [{ to: view, letter: accountChanged({ ...view, change }) }];
  },
  'order-confirmed': async (actor, { orderId, link }) => {
    const view = await orders.readOrderForMail(actor, OrderId.parse(orderId));
    return [{ to: view, letter: orderConfirmed({ ...view, link: link ?? view.link }) }];
  },
  'order-backordered': async (actor, { orderId }) => {
    const view = await orders.readOrderForMail(actor, OrderId.parse(orderId));
    return [{ to: view, letter: orderBackordered(view) }];
  },
  'order-shipped': async (actor, { orderId }) => {
    const view = await orders.readOrderForMail(actor, OrderId.parse(orderId));
    return [{ to: view, letter: orderShipped(view) }];
  },
  'version-held': (actor, { versionId }) => toEditors(actor, versionId, versionHeld),
  'version-released': (actor, { versionId }) => toEditors(actor, versionId, versionReleased),
};

async function toEditors(actor: Actor, versionId: string, write: (view: VersionMailView) => Letter): Promise<Mail[]> {
  const { kitName, letter, remark, recipients } = await kits.readVersionForMail(actor, VersionId.parse(versionId));
  const link = addressOf(`/bench/${versionId}`);
  return recipients.map((to) => ({ to, letter: write({ name: to.name, kitName, letter, remark, link }) }));
}

const addressOf = (path: string) => new URL(path, env().COILYARD_URL).toString();

/** The mails that a queued kind and payload stand for. */
export function writeMails(actor: Actor, kind: string, payload: unknown): Promise<Mail[]> {
  if (!isKind(kind)) throw new RangeError(`No mail of the kind ${kind}.`);
  return writeOne(actor, kind, payload);
}

function writeOne<K extends MailKind>(actor: Actor, kind: K, payload: unknown): Promise<Mail[]> {
  const writer: Writer<K> = writers[kind];
  // The schema of this very kind has just read it; the compiler cannot follow the pair through the table.
  return writer(actor, payloads[kind].parse(payload) as MailPayload<K>);
}

const isKind = (text: string): text is MailKind => Object.hasOwn(payloads, text);
