'use server';

import { action } from '@/app/action';
import * as check from '@/services/check';
import * as kits from '@/services/kits';
import * as parts from '@/services/parts';

export const createKit = action(kits.createKit, { refresh: ['/bench'] });
export const startVersion = action(kits.startVersion, { refresh: ['/bench'] });
export const addLine = action(kits.addLine);
export const saveLine = action(kits.saveLine);
export const removeLine = action(kits.removeLine);
export const saveCircuit = action(kits.saveCircuit);
export const saveGuide = action(kits.saveGuide);
export const sendToCheck = action(check.sendToCheck, { refresh: ['/bench', '/check'] });
export const callBack = action(check.callBack, { refresh: ['/bench', '/check'] });
export const addPart = action(parts.addPart, { refresh: ['/bench/parts'] });
export const changePart = action(parts.changePart, { refresh: ['/bench/parts'] });
export const retirePart = action(parts.retirePart, { refresh: ['/bench/parts'] });
