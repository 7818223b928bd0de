import { headers } from 'next/headers';
import { forbidden, notFound, redirect } from 'next/navigation';
import { type Actor, type Deed, must } from '@/services/access';
import { currentActor } from '@/services/people';
import { Problem } from '@/services/problem';

/**
 * Reads a page's view as whoever asks. What is missing shows the page "not found", what is not allowed the page that
 * says whom to ask; somebody who has not signed in is asked to, and comes back here.
 */
export async function view<T>(read: (actor: Actor) => Promise<T>): Promise<T> {
  const actor = await currentActor();
  try {
    return await read(actor);
  } catch (error) {
    if (!(error instanceof Problem)) throw error;
    // An address with an id or a page of a list that cannot be leads nowhere, as one that is not there.
    if (error.kind === 'missing' || error.kind === 'invalid') notFound();
    if (error.kind !== 'forbidden') throw error;
    if (actor.kind === 'visitor') redirect(`/sign-in?next=${encodeURIComponent(await path())}`);
    forbidden();
  }
}

/**
 * The door of a room, asked for by its layout so that the answer has its right status. Each page inside asks again for
 * itself: a layout is not run anew when one moves between its pages.
 */
export const enter = (deed: Deed): Promise<Actor> =>
  view((actor) => {
    must(actor, deed);
    return Promise.resolve(actor);
  });

/** The path that was asked for; `proxy.ts` notes it, since a page is not told its own address. */
async function path(): Promise<string> {
  return (await headers()).get('x-path') ?? '/';
}
