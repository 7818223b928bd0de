import { env } from '../env';

/** The maker as the papers name it, and where a missing part is reported; both as an installation has set them. */
export const sellerLine = () => nameOf(env().MAIL_FROM);
export const contactOf = () => addressOf(env().MAIL_FROM);

const form = /^\s*"?([^"<]*?)"?\s*<([^>]+)>\s*$/;

const nameOf = (from: string) => form.exec(from)?.[1] || from;
const addressOf = (from: string) => form.exec(from)?.[2] ?? from;
