import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { LinkForm } from '@/components/account/link-form';
import { PasswordForm } from '@/components/account/password-form';
import { TextLink } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { afterSignIn, currentActor } from '@/services/people';
import { safePath, signInSentence } from '@/services/people/rules';
import { askForLink } from '../actions';

export const metadata: Metadata = { title: 'Sign in' };

type Search = Promise<Record<string, string | string[] | undefined>>;

export default async function SignInPage({ searchParams }: { searchParams: Search }) {
  const search = await searchParams;
  const next = safePath(typeof search['next'] === 'string' ? search['next'] : null);
  const goOn = afterSignIn(await currentActor(), next);
  if (goOn !== null) redirect(goOn);
  return (
    <>
      <h1 className="font-display text-page">Sign in</h1>
      <div className="mt-4 max-w-measure empty:hidden">{noticeOf(search)}</div>
      <div className="mt-6 grid items-start gap-6 md:grid-cols-2">
        <Panel title="With a password">
          <PasswordForm next={next} />
        </Panel>
        <Panel title="With a link by mail" note="For customers. No password needed.">
          <LinkForm onAsk={askForLink} />
        </Panel>
      </div>
      <p className="mt-6">
        New here? <TextLink href="/join">Open an account</TextLink>. You can also order as a guest; each mail about the
        order opens it.
      </p>
    </>
  );
}

function noticeOf(search: Record<string, string | string[] | undefined>) {
  const { next, error } = search;
  if (search['changed'] !== undefined) {
    return (
      <Notice kind="clears" title="Your password is changed">
        All browsers were signed out. Sign in with the new one.
      </Notice>
    );
  }
  if (search['joined'] !== undefined) {
    return (
      <Notice kind="clears" title="Your way in is set up">
        Sign in with your password and the next code of your authenticator.
      </Notice>
    );
  }
  if (typeof error === 'string') return <Notice kind="stops" title={signInSentence(error)} />;
  if (next !== undefined)
    return <Notice kind="info" title="Sign in to go on. You come back to the page you asked for." />;
  return null;
}
