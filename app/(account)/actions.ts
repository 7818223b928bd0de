'use server';

import { action } from '@/app/action';
import * as people from '@/services/people';

export const askForLink = action(async (actor, input: Parameters<typeof people.askForLink>[1]) =>
  people.askForLink(actor, input, await people.currentVisit()),
);
export const createAccount = action(async (actor, input: Parameters<typeof people.createAccount>[1]) =>
  people.createAccount(actor, input, await people.currentVisit()),
);
export const acceptInvitation = action(people.acceptInvitation);
export const changePassword = action(people.changePassword);
export const signOutEverywhere = action((actor, _nothing: null) => people.signOutEverywhere(actor));
