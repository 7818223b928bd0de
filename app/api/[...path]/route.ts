import { problemResponse } from '@/app/endpoint';
import { missing } from '@/services/problem';

const nothing = () =>
  problemResponse(missing('Nothing of the API has this address. Compare it with the one you meant to ask.'));

/** Whatever no other route answers: programs get a problem they can read, not a page. */
export { nothing as DELETE, nothing as GET, nothing as PATCH, nothing as POST, nothing as PUT };
