'use server';

import { action } from '@/app/action';
import * as packing from '@/services/packing';

const refresh = ['/packing', '/packing/pick-list', '/packing/dispatch'];

export const claimBox = action(packing.claimBox, { refresh });
export const scan = action(packing.scan);
export const putBack = action(packing.putBack);
export const tellEmpty = action(packing.tellEmpty);
export const markPrinted = action(packing.markPrinted);
export const weigh = action(packing.weigh);
export const closeBox = action(packing.closeBox, { refresh });
export const ship = action(packing.ship, { refresh: [...refresh, '/desk', '/desk/orders'] });
