import type { Metadata } from 'next';
import { PlainPage } from '@/components/shell/plain-page';
import { LinkButton } from '@/components/ui/link-button';

export const metadata: Metadata = { title: 'Not here' };

export default function NotFound() {
  return (
    <PlainPage title="Nothing stands at this address" drawing="reel">
      <p>
        It may have been moved, or the address has a slip in it. If a link of ours led you here, the link is wrong, not
        you.
      </p>
      <p className="flex flex-wrap gap-3">
        <LinkButton href="/" variant="primary">
          See the kits
        </LinkButton>
        <LinkButton href="/orders">My orders</LinkButton>
      </p>
    </PlainPage>
  );
}
