import type { Metadata } from 'next';
import { PlainPage } from '@/components/shell/plain-page';
import { LinkButton } from '@/components/ui/link-button';
import { currentActor } from '@/services/people';

export const metadata: Metadata = { title: 'Not with your roles' };

/** What is not for the reader: staff are told whom to ask, a buyer where the own orders stand. */
export default async function Forbidden() {
  const actor = await currentActor();
  if (actor.kind !== 'staff') {
    return (
      <PlainPage title="This page is for the people of the yard" drawing="box">
        <p>You are signed in as a buyer. What you ordered stands under My orders, and the kits in the shop.</p>
        <p className="flex flex-wrap gap-3">
          <LinkButton href="/orders" variant="primary">
            My orders
          </LinkButton>
          <LinkButton href="/">To the shop</LinkButton>
        </p>
      </PlainPage>
    );
  }
  return (
    <PlainPage title="This is not part of your work here" drawing="terminal">
      <p>
        Each room is open to those whose role needs it. If you need this page for your work, ask the owner for the role;
        it counts from the next click.
      </p>
      <p className="flex flex-wrap gap-3">
        <LinkButton href="/account" variant="primary">
          See my roles
        </LinkButton>
        <LinkButton href="/">To the shop</LinkButton>
      </p>
    </PlainPage>
  );
}
