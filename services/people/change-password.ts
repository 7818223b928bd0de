import { type Actor, must, personIdOf } from '../access';
import * as mail from '../mail';
import { forbidden, invalid, parse } from '../problem';
import { reading, record, write } from '../record';
import { countTry, forgetTries } from './attempts';
import { hashPassword, verifyPassword } from './password';
import * as rows from './rows';
import { passwordFault } from './rules';
import { ChangePassword } from './schemas';

/** Sets one's own password and ends all one's sessions, this one too. The change is told by mail. */
export async function changePassword(actor: Actor, input: ChangePassword): Promise<{ email: string }> {
  must(actor, 'account.change-own');
  const { current, next } = parse(ChangePassword, input);
  const id = personIdOf(actor);
  if (id === null) throw forbidden('Sign in to change your password.');
  const person = await rows.getPerson(reading(), id);
  const fault = passwordFault(next, person.kind, [...person.name.split(' '), person.email.split('@')[0] ?? '']);
  if (fault !== null) throw invalid('The new password needs another look.', { next: fault });
  const key = `password:${id}`;
  if (person.passwordHash !== null) {
    await write(actor, (tx) => countTry(tx, key));
    if (!(await verifyPassword(person.passwordHash, current))) {
      throw invalid('The password of now does not fit.', { current: 'This is not your password of now.' });
    }
  }
  const passwordHash = await hashPassword(next);

  return write(actor, async (tx) => {
    await forgetTries(tx, key);
    await rows.changeAndEndSessions(tx.sql, id, { password_hash: passwordHash });
    await record(tx, 'password.changed', { subject: { kind: 'person', id } });
    const mailKey = `password:${id}:${person.sessionVersion}`;
    await mail.queue(tx, 'account-changed', { personId: id, change: 'password' }, mailKey);
    return { email: person.email };
  });
}
