import { createHmac, timingSafeEqual } from 'node:crypto';
import { env } from '../env';
import { sha256 } from '../record';

/**
 * The secret in an order's long link. It is worked out from the installation's secret whenever a mail or an address
 * needs it; the database holds its hash only.
 */
export const orderKey = (orderId: string): string =>
  createHmac('sha256', env().NEXTAUTH_SECRET).update(`order ${orderId}`).digest('base64url');

export function keyFits(key: string | undefined, linkHash: string): boolean {
  if (key === undefined) return false;
  return timingSafeEqual(Buffer.from(sha256(key)), Buffer.from(linkHash));
}

/** The address that opens the order without signing in. */
export const orderLink = (orderId: string): string =>
  `${env().COILYARD_URL}/orders/${orderId}?key=${orderKey(orderId)}`;
