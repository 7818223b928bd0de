import { type Letter, letter } from './letter';

export const signInLink = (view: { name: string; link: string }): Letter =>
  letter('Your link to sign in', view.name, [
    { line: 'This link signs you in. It works once, for ten minutes, in the browser that asked for it.' },
    { link: view.link, label: 'Sign in' },
    { line: 'If you did not ask for it, leave it: without your browser it opens nothing.' },
  ]);
