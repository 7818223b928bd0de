import { z } from 'zod';

const State = z.object({ payment: z.string() });

/** Asks the product's own API whether an order is paid; no answer counts as not yet. */
export async function hasBeenPaid(orderId: string, key: string | null): Promise<boolean> {
  const query = key === null ? '' : `?key=${encodeURIComponent(key)}`;
  const response = await fetch(`/api/v1/orders/${orderId}${query}`, { cache: 'no-store' }).catch(() => null);
  if (!response?.ok) return false;
  const state = State.safeParse(await response.json());
  return state.success && state.data.payment !== 'awaiting-payment';
}
