import { type Letter, letter } from './letter';

export const noLink = (view: { reason: 'no-account' | 'staff'; link: string }): Letter =>
  letter('You asked for a link to sign in', null, [
    {
      line:
        view.reason === 'staff'
          ? 'Somebody asked for a link to sign in with this address. Staff sign in with password and code; no link is given.'
          : 'Somebody asked for a link to sign in with this address. There is no account under it, so no link is given.',
    },
    { link: view.link, label: view.reason === 'staff' ? 'Sign in with password and code' : 'Open an account' },
    { line: 'If it was not you, nothing needs doing.' },
  ]);
