import type { BoxState } from '@/services/packing/schemas';

export const boxStateWords: Record<BoxState, string> = {
  'to-pack': 'Waiting to be packed',
  packing: 'In the tray',
  closed: 'Closed, in the house',
  shipped: 'Sent',
};
