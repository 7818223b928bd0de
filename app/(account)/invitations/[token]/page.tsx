import type { Metadata } from 'next';
import { EnrolmentForm } from '@/components/account/enrolment-form';
import { QrCode } from '@/components/account/qr-code';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { currentActor, readInvitation } from '@/services/people';
import { Problem } from '@/services/problem';
import { showDate } from '@/services/time';
import { acceptInvitation } from '../../actions';

export const metadata: Metadata = { title: 'Your way in', referrer: 'no-referrer' };

export default async function InvitationPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  const invitation = await openInvitation(token);
  if (typeof invitation === 'string') {
    return (
      <>
        <h1 className="font-display text-page">Your way in</h1>
        <div className="mt-6 max-w-measure">
          <Notice
            kind="stops"
            title="Nothing to set up here"
            actions={<LinkButton href="/sign-in">Sign in</LinkButton>}
          >
            {invitation}
          </Notice>
        </div>
      </>
    );
  }
  return (
    <>
      <h1 className="font-display text-page">Good day {invitation.name}</h1>
      <p className="mt-2 max-w-measure text-lead">
        Your work in the yard: {invitation.roles.join(', ')}. Set up a password and a second factor by{' '}
        {showDate(invitation.expiresAt)}.
      </p>
      <div className="mt-6 grid items-start gap-6 md:grid-cols-2">
        <Panel title="1. Your authenticator" note="An app that shows a new code each half minute.">
          <p className="mb-4">Point it at these squares, or type the letters below.</p>
          <QrCode qr={invitation.qr} label="Squares that an authenticator reads; the letters below say the same" />
          <p className="mt-4 font-figures font-semibold break-all">{inFours(invitation.secret)}</p>
          <p className="mt-2">
            <a className="link" href={invitation.uri}>
              Open an authenticator on this device
            </a>
          </p>
        </Panel>
        <Panel title="2. Password and first code">
          <EnrolmentForm token={token} email={invitation.email} onAccept={acceptInvitation} />
        </Panel>
      </div>
    </>
  );
}

/** The invitation, or the sentence that says why there is none to open. */
async function openInvitation(token: string) {
  try {
    return await readInvitation(await currentActor(), token);
  } catch (error) {
    if (error instanceof Problem && error.kind === 'missing') return error.message;
    throw error;
  }
}

const inFours = (secret: string) => secret.replace(/(.{4})(?=.)/g, '$1 ');
