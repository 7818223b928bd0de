import { createCipheriv, createDecipheriv, createHash, createHmac, hkdfSync, randomBytes } from 'node:crypto';
import { env } from '../env';

/** A key of its own for each purpose, so that no answer for one can be replayed for another. */
function keyFor(purpose: string): Buffer {
  return Buffer.from(hkdfSync('sha256', env().NEXTAUTH_SECRET, 'coilyard', purpose, 32));
}

/** 256 bits in base64url, derived when a mail is written: the database alone holds no usable link. */
export function tokenFor(purpose: 'sign-in-link' | 'invitation', id: string): string {
  return createHmac('sha256', keyFor(purpose)).update(id).digest('base64url');
}

/** The first 160 bits for a second factor that an invitation offers, the same on each look at its page. */
export function factorFor(invitationId: string): Buffer {
  return createHmac('sha256', keyFor('second factor')).update(invitationId).digest().subarray(0, 20);
}

export const hashOf = (token: string): string => createHash('sha256').update(token).digest('hex');

/** Stands for an address or a network address in the counters: the same in, the same out, not to be read back. */
export const blind = (text: string): string => createHmac('sha256', keyFor('counter')).update(text).digest('base64url');

/** Proves that a browser has signed this person in before; "person.random.proof". */
export function deviceMark(personId: string): string {
  const random = randomBytes(16).toString('base64url');
  return `${personId}.${random}.${proofOf(personId, random)}`;
}

/** The random part of a mark that is ours and of this person, or null. */
export function knownDevice(mark: string | null, personId: string): string | null {
  const [id, random = '', proof] = (mark ?? '').split('.');
  return id === personId && proof === proofOf(personId, random) ? random : null;
}

const proofOf = (personId: string, random: string) =>
  createHmac('sha256', keyFor('device')).update(`${personId}.${random}`).digest('base64url');

/** Seals a secret for storage with AES-256-GCM: 12 bytes of nonce, 16 of tag, then the text. */
export function seal(text: string, context: string): string {
  const nonce = randomBytes(12);
  const cipher = createCipheriv('aes-256-gcm', keyFor('seal'), nonce).setAAD(Buffer.from(context));
  const body = Buffer.concat([cipher.update(text, 'utf8'), cipher.final()]);
  return Buffer.concat([nonce, cipher.getAuthTag(), body]).toString('base64url');
}

/** @throws when the secret of the installation or the row it belongs to is another one */
export function unseal(sealed: string, context: string): string {
  const bytes = Buffer.from(sealed, 'base64url');
  const decipher = createDecipheriv('aes-256-gcm', keyFor('seal'), bytes.subarray(0, 12), { authTagLength: 16 });
  decipher.setAAD(Buffer.from(context)).setAuthTag(bytes.subarray(12, 28));
  return Buffer.concat([decipher.update(bytes.subarray(28)), decipher.final()]).toString('utf8');
}
