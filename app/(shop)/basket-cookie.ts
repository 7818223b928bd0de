import { cookies } from 'next/headers';
import { env } from '@/services/env';
import { newId } from '@/services/ids';

const isSecure = () => env().COILYARD_URL.startsWith('https:');
/** Browsers take the prefixed name only over https, which is what it promises. */
const cookieName = () => (isSecure() ? '__Host-basket' : 'basket');
const seconds = 60 * 24 * 3600;

/** The id of this browser's basket, or null where it has none yet. */
export async function basketId(): Promise<string | null> {
  return (await cookies()).get(cookieName())?.value ?? null;
}

/** The id to write to: the one there is, or a new one that the browser keeps for sixty days. Actions only. */
export async function basketIdForWriting(): Promise<string> {
  const id = (await basketId()) ?? newId();
  (await cookies()).set(cookieName(), id, {
    httpOnly: true,
    sameSite: 'lax',
    secure: isSecure(),
    path: '/',
    maxAge: seconds,
  });
  return id;
}
