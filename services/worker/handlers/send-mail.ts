import type { Actor } from '../../access';
import { MailJob } from '../../mail';
import type { Job } from '../../outbox';
import { writeMails } from './mails';
import { send } from './transport';

/** Writes and sends what a job of the outbox asks for. Anything that goes wrong is thrown: the job waits and returns. */
export async function sendMail(actor: Actor, job: Job): Promise<void> {
  const { mail, of } = MailJob.parse(job.payload);
  const mails = await writeMails(actor, mail, of);
  for (const [index, one] of mails.entries()) await send(`${job.id}.${index}`, one);
}
