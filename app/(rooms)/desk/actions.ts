'use server';

import { action } from '@/app/action';
import { setPrice } from '@/services/catalogue';
import { setDelivery, setTax } from '@/services/orders';

export const price = action(setPrice, { refresh: ['/desk', '/desk/kits', '/', '/kits/[code]'] });
export const delivery = action(setDelivery, { refresh: ['/desk/kits', '/checkout'] });
export const tax = action(setTax, { refresh: ['/desk/kits', '/checkout'] });
