import { type Letter, letter } from './letter';

const facts = {
  password: 'The password of your account was changed just now. All browsers were signed out.',
  roles: 'The owner changed what you may do in the yard. Sign in again to go on.',
  'way-in': 'Your password and second factor were set anew just now. All browsers were signed out.',
} as const;

export const accountChanged = (view: { name: string; change: keyof typeof facts; link: string }): Letter =>
  letter('Your account was changed', view.name, [
    { line: facts[view.change] },
    { link: view.link, label: 'Sign in' },
    { line: 'If this was not you, answer this mail today: somebody else may know your password.' },
  ]);
