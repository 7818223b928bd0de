import { randomInt } from 'node:crypto';

const LETTERS = 'ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789';

export function newId(prefix: string, length = 24): string {
  let id = `${prefix}_`;
  for (let i = 0; i < length; i += 1) id += LETTERS.charAt(randomInt(LETTERS.length));
  return id;
}
