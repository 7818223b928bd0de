import { type Letter, letter } from './letter';

export const invitation = (view: { name: string; link: string; roles: readonly string[] }): Letter =>
  letter('Your way into the yard', view.name, [
    { line: `You are asked to work in the yard as ${inWords(view.roles)}.` },
    { line: 'Have an authenticator at hand: the page asks for a password and for one code of a second factor.' },
    { link: view.link, label: 'Set up your way in' },
    { line: 'The link works once, for a week. If you do not know what this is about, leave it.' },
  ]);

const inWords = (roles: readonly string[]) =>
  roles.length < 2 ? roles.join('') : `${roles.slice(0, -1).join(', ')} and ${roles.at(-1) ?? ''}`;
