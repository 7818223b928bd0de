import type { Metadata } from 'next';
import { view } from '@/app/view';
import { ChangePasswordForm } from '@/components/account/change-password-form';
import { SignOut } from '@/components/account/sign-out';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { readAccount } from '@/services/people';
import { showDate } from '@/services/time';
import { changePassword, signOutEverywhere } from '../actions';

export const metadata: Metadata = { title: 'Account' };

export default async function AccountPage() {
  const account = await view(readAccount);
  return (
    <>
      <h1 className="font-display text-page">Account</h1>
      <div className="mt-6 grid items-start gap-6 md:grid-cols-2">
        <Panel title={account.name}>
          <dl className="grid grid-cols-[auto_1fr] gap-x-6 gap-y-2">
            <dt className="text-ink2">E-mail</dt>
            <dd className="break-all">{account.email}</dd>
            {account.kind === 'staff' && (
              <>
                <dt className="text-ink2">Roles</dt>
                <dd>{account.roles.join(', ')}</dd>
              </>
            )}
            <dt className="text-ink2">Here since</dt>
            <dd>{showDate(account.createdAt)}</dd>
          </dl>
          <div className="mt-6">
            <SignOut onEverywhere={signOutEverywhere} />
          </div>
        </Panel>
        <Panel title="Password" note="Changing it signs you out everywhere.">
          {!account.hasPassword && (
            <Notice kind="info" title="You have no password yet" className="mb-4">
              You sign in by a link each time. With a password you need no mail.
            </Notice>
          )}
          <ChangePasswordForm
            kind={account.kind}
            email={account.email}
            hasPassword={account.hasPassword}
            onChange={changePassword}
          />
        </Panel>
      </div>
    </>
  );
}
