import nodemailer, { type Transporter } from 'nodemailer';
import { env } from '../../env';
import { oneLine } from '@/templates/mails/letter';
import type { Mail } from './mails';

let pool: Transporter | undefined;

/** A few kept connections to the mail server. Nothing in a message may name a file or an address to fetch. */
function transport(): Transporter {
  const { SMTP_HOST, SMTP_PORT, SMTP_USER, SMTP_PASSWORD } = env();
  pool ??= nodemailer.createTransport({
    pool: true,
    maxConnections: 2,
    host: SMTP_HOST,
    port: SMTP_PORT,
    secure: SMTP_PORT === 465,
    requireTLS: SMTP_USER !== undefined && SMTP_PORT !== 465,
    ...(SMTP_USER !== undefined && { auth: { user: SMTP_USER, pass: SMTP_PASSWORD ?? '' } }),
    connectionTimeout: 10_000,
    greetingTimeout: 10_000,
    socketTimeout: 30_000,
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  return pool;
}

/** @param id stays the same however often the message is tried, so that a reader's server can drop a second copy */
export async function send(id: string, { to, letter }: Mail): Promise<void> {
  await transport().sendMail({
    from: env().MAIL_FROM,
    to: { name: oneLine(to.name), address: to.email },
    subject: letter.subject,
    text: letter.text,
    html: letter.html,
    messageId: `<${id}@${new URL(env().COILYARD_URL).hostname}>`,
    headers: { 'Auto-Submitted': 'auto-generated' },
    disableFileAccess: true,
    disableUrlAccess: true,
  });
}

export function closeTransport(): void {
  pool?.close();
  pool = undefined;
}
