import { env } from '@/services/env';
import { forbidden } from '@/services/problem';

/**
 * Refuses a change that another site's page set off in somebody's browser. Browsers say where a request comes from;
 * one that does not, or says "null", is refused as well. Requests that only read need no such proof.
 */
export function refuseForeign(headers: Headers): void {
  const origin = headers.get('origin');
  const site = headers.get('sec-fetch-site');
  const isOwnSite = site === null || site === 'same-origin' || site === 'none';
  if (origin !== null && isOwnSite && isOurs(origin, headers.get('host'))) return;
  throw forbidden(
    'This request did not come from a page of ours, so nothing was changed. Open the page again and retry.',
  );
}

function isOurs(origin: string, host: string | null): boolean {
  const own = new URL(env().COILYARD_URL);
  if (origin === own.origin) return true;
  return URL.canParse(origin) && new URL(origin).protocol === own.protocol && new URL(origin).host === host;
}
