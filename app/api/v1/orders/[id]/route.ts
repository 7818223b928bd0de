import { endpoint } from '@/app/endpoint';
import { readOrder } from '@/services/orders';
import type { OrderRef } from '@/services/orders/schemas';

/** One order, for whoever it belongs to or holds its key. */
export const GET = endpoint({
  deed: readOrder,
  input: (request, { id }): OrderRef => {
    const key = new URL(request.url).searchParams.get('key');
    return { orderId: `${String(id)}`, ...(key !== null && { key }) } as OrderRef; // readOrder parses it
  },
});
