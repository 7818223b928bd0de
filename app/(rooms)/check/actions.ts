'use server';

import { action } from '@/app/action';
import * as check from '@/services/check';

const refresh = ['/check', '/bench', '/'];

export const hold = action(check.hold, { refresh });
export const release = action(check.release, { refresh });
export const withdraw = action(check.withdraw, { refresh });
