'use server';

import { action } from '@/app/action';
import * as people from '@/services/people';

const refresh = ['/desk/people', '/desk/people/[person]'];

export const inviteStaff = action(people.inviteStaff, { refresh });
export const changeRoles = action(people.changeRoles, { refresh });
export const sendNewWayIn = action(people.sendNewWayIn, { refresh });
