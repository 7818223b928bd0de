'use server';

import { action } from '@/app/action';
import { blockLot } from '@/services/orders';
import { acceptLot, receiveLot } from '@/services/stock';

const refresh = ['/store', '/store/receive'];

export const receive = action(receiveLot, { refresh });
export const accept = action(acceptLot, { refresh });
export const block = action(blockLot, { refresh });
