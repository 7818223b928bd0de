import { inject } from 'vitest';

export interface Letter {
  subject: string;
  text: string;
  html: string;
}

interface Stored {
  id: string;
  subject: string;
  text?: string;
  html?: string;
  to?: { address: string }[];
}

/** The newest letter to an address that fits, read through the mail stand-in's API; waits for the worker to send it. */
export async function letterTo(address: string, subject = /./): Promise<Letter> {
  for (let tries = 0; tries < 60; tries++) {
    const answer = await fetch(`${inject('mailUrl')}/api/email`);
    const stored = (await answer.json()) as Stored[]; // the stand-in's own form, of which these members are used
    const fits = stored.filter(
      (letter) => letter.to?.some((to) => to.address === address) && subject.test(letter.subject),
    );
    const newest = fits.at(-1);
    if (newest) return { subject: newest.subject, text: newest.text ?? '', html: newest.html ?? '' };
    await new Promise((resolve) => setTimeout(resolve, 500));
  }
  throw new Error(`No letter to ${address} came within 30 seconds.`);
}
