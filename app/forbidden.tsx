import type { Metadata } from 'next';
import { PlainPage } from '@/components/shell/plain-page';
import { LinkButton } from '@/components/ui/link-button';

export const metadata: Metadata = { title: 'Not with your roles' };

export default function Forbidden() {
  return (
    <PlainPage title="This is not part of your work here">
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
