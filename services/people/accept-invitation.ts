import { type Actor, must } from '../access';
import { PersonId, newId } from '../ids';
import * as mail from '../mail';
import { invalid, missing, parse, refused } from '../problem';
import { now, reading, record, write } from '../record';
import { hashPassword } from './password';
import * as rows from './rows';
import * as ways from './way-in-rows';
import { passwordFault } from './rules';
import { AcceptInvitation, type EnrolmentView, Token } from './schemas';
import { enrolmentUri, factorFromBytes, qrOf, stepOf } from './second-factor';
import { factorFor, hashOf, seal } from './secrets';

const isOver = 'This invitation is used or older than a week. Ask the owner of the yard for a new one.';

/** What an open invitation offers: the roles and a second factor to enrol. Missing once it is used or over. */
export async function readInvitation(actor: Actor, token: string): Promise<EnrolmentView> {
  must(actor, 'invitation.accept');
  const whole = Token.safeParse(token);
  const invitation = whole.success ? await ways.findInvitation(reading(), { token_hash: hashOf(whole.data) }) : null;
  if (!invitation || invitation.acceptedAt !== null || invitation.expiresAt <= now()) throw missing(isOver);
  const secret = factorFromBytes(factorFor(invitation.id));
  const uri = enrolmentUri(secret, invitation.email);
  const { name, email, roles, expiresAt } = invitation;
  return { name, email, roles, expiresAt, secret, uri, qr: qrOf(uri) };
}

/**
 * Sets the password, enrols the second factor with one code of it and makes the person staff with the roles offered;
 * for somebody who is staff already it replaces both and ends all sessions. Works once.
 */
export async function acceptInvitation(actor: Actor, input: AcceptInvitation): Promise<{ email: string }> {
  must(actor, 'invitation.accept');
  const { token, password, code } = parse(AcceptInvitation, input);
  const invitation = await ways.findInvitation(reading(), { token_hash: hashOf(token) });
  if (!invitation) throw missing(isOver);
  const fault = passwordFault(password, 'staff', [...invitation.name.split(' '), invitation.email.split('@')[0] ?? '']);
  if (fault !== null) throw invalid('The password needs another look.', { password: fault });
  const secret = factorFromBytes(factorFor(invitation.id));
  const step = stepOf(secret, code, now(), 0);
  if (step === null) {
    throw invalid('The code does not fit yet.', {
      code: 'Not the code of the moment. Wait for the next one; if it never fits, set the clock of your device.',
    });
  }
  const passwordHash = await hashPassword(password);

  return write(actor, async (tx) => {
    if (!(await ways.markAccepted(tx.sql, invitation.id, tx.now))) throw missing(isOver);
    const known = await rows.findPerson(tx.sql, { email: invitation.email });
    if (known && (known.kind !== 'staff' || known.disabledAt !== null)) {
      throw refused('This address has another account by now. Ask the owner of the yard for a new invitation.');
    }
    const id = known?.id ?? PersonId.parse(newId());
    const sealedFactor = seal(secret, id);
    const subject = { kind: 'person', id };
    if (known) {
      const change = { password_hash: passwordHash, totp_secret: sealedFactor, totp_step: step };
      await rows.changeAndEndSessions(tx.sql, id, change);
      await record(tx, 'staff.set-new-way-in', { subject, reason: `invitation ${invitation.id}` });
      await mail.queue(tx, 'account-changed', { personId: id, change: 'way-in' }, `way-in:${invitation.id}`);
    } else {
      const { name, email, roles } = invitation;
      const person = { id, kind: 'staff', name, email, roles, passwordHash, sealedFactor, factorStep: step } as const;
      await rows.insertPerson(tx.sql, person, tx.now);
      const after = rows.forRecord({ ...person, disabledAt: null });
      await record(tx, 'staff.joined', { subject, after, reason: `invitation ${invitation.id}` });
    }
    return { email: invitation.email };
  });
}
