import { endpoint } from '@/app/endpoint';
import { listParts } from '@/services/parts';
import type { ListParts } from '@/services/parts/schemas';

/** Parts by kind, place and words, a page at a time: `?place=detector&q=germanium&after=C-365`. */
export const GET = endpoint({
  deed: listParts,
  input: (request): ListParts => {
    const asked = Object.fromEntries([...new URL(request.url).searchParams].filter(([, value]) => value !== ''));
    // Whatever was asked goes to the deed, which parses it and names what does not fit.
    return asked as ListParts;
  },
});
