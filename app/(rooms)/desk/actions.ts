'use server';

import { action } from '@/app/action';
import { setPrice } from '@/services/catalogue';

export const price = action(setPrice, { refresh: ['/desk', '/desk/kits', '/', '/kits/[code]'] });
