import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { JoinForm } from '@/components/account/join-form';
import { TextLink } from '@/components/ui/link-button';
import { Panel } from '@/components/ui/panel';
import { afterSignIn, currentActor } from '@/services/people';
import { createAccount } from '../actions';

export const metadata: Metadata = { title: 'Open an account' };

export default async function JoinPage() {
  const goOn = afterSignIn(await currentActor(), null);
  if (goOn !== null) redirect(goOn);
  return (
    <>
      <h1 className="font-display text-page">Open an account</h1>
      <div className="mt-6 max-w-measure">
        <Panel
          title="Your orders in one place"
          note="A mail with a link shows that the address is yours; a password can follow later."
        >
          <JoinForm onJoin={createAccount} />
        </Panel>
        <p className="mt-6">
          Been here before? <TextLink href="/sign-in">Sign in</TextLink>.
        </p>
      </div>
    </>
  );
}
