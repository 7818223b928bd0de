import type { Metadata } from 'next';
import { UseLinkForm } from '@/components/account/use-link-form';
import { LinkButton } from '@/components/ui/link-button';
import { Panel } from '@/components/ui/panel';
import { Token } from '@/services/people/schemas';

export const metadata: Metadata = { title: 'Sign in by link', referrer: 'no-referrer' };

type Search = Promise<Record<string, string | string[] | undefined>>;

/** Opening the page uses nothing up, however often a mail scanner does it; the button does. */
export default async function LinkPage({ searchParams }: { searchParams: Search }) {
  const token = Token.safeParse((await searchParams)['token']);
  return (
    <>
      <h1 className="font-display text-page">Sign in by link</h1>
      <div className="mt-6 max-w-measure">
        {token.success ? (
          <Panel title="One press and you are in" note="The link works once, in the browser that asked for it.">
            <UseLinkForm token={token.data} />
          </Panel>
        ) : (
          <Panel title="This link is not complete">
            <p className="mb-4">
              Open it from the mail once more, or ask for a new one. Mail programs sometimes cut long addresses.
            </p>
            <LinkButton href="/sign-in" variant="primary">
              Ask for a new link
            </LinkButton>
          </Panel>
        )}
      </div>
    </>
  );
}
