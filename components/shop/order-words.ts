import type { OrderRow } from '@/services/orders/schemas';

/** Where an order stands, in one word a customer reads, with its tone. */
export function standing({ payment, fulfilment }: Pick<OrderRow, 'payment' | 'fulfilment'>): {
  word: string;
  tone: 'plain' | 'pine' | 'enamel' | 'ochre' | 'crimson' | 'dashed';
} {
  if (payment === 'refunded') return { word: 'Paid back', tone: 'plain' };
  if (fulfilment === 'cancelled') return { word: 'Cancelled', tone: 'plain' };
  if (payment === 'awaiting-payment') return { word: 'Not paid yet', tone: 'dashed' };
  switch (fulfilment) {
    case 'shipped':
      return { word: 'Sent', tone: 'pine' };
    case 'packed':
      return { word: 'Packed', tone: 'enamel' };
    case 'picking':
      return { word: 'Being packed', tone: 'enamel' };
    case 'backordered':
      return { word: 'Short of a part', tone: 'ochre' };
    default:
      return { word: 'Paid', tone: 'pine' };
  }
}
