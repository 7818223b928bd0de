import type { Role } from '../access';
import { type Instant, days, minutes } from '../time';

/** How long things last. */
export const life = {
  staffSession: 12 * minutes(60),
  customerSession: days(30),
  link: minutes(10),
  invitation: days(7),
} as const;

/** RFC 5321 4.5.3.1: 64 octets before the sign, 254 in all that fit into a mail's envelope. */
const longest = { local: 64, address: 254 };

/**
 * One form of an address, or null when it is none. Characters that only look alike are folded first (NFKC), so that a
 * full-width sign cannot smuggle in a second recipient; then plain characters only: no quotes, comments, lists.
 */
export function normaliseEmail(text: string): string | null {
  if (text.length > 1000) return null;
  const address = text.trim().normalize('NFKC').toLowerCase();
  const [local = '', domain = '', ...more] = address.split('@');
  if (more.length > 0 || local.length > longest.local || address.length > longest.address) return null;
  const isLocal = /^[a-z0-9!#$%&'*+/=?^_`{|}~.-]+$/.test(local) && !/^\.|\.\.|\.$/.test(local);
  const labels = domain.split('.');
  const isDomain = labels.length > 1 && labels.every((label) => /^(?!-)[a-z0-9-]{1,63}(?<!-)$/.test(label));
  return isLocal && isDomain && !/^\d+$/.test(labels.at(-1) ?? '') ? address : null;
}

export const passwordLength = { staff: 8, customer: 10, most: 128 } as const;

/** Guessed first by whoever guesses; long enough to pass the length alone. */
const guessedFirst = [
  'password',
  'passwort',
  'letmein',
  'welcome',
  'qwerty',
  'qwertz',
  'azerty',
  'iloveyou',
  'football',
  'baseball',
  'sunshine',
  'princess',
  'dragon',
  'monkey',
  'superman',
  'trustno',
  'changeme',
  'abc123',
  'secret',
];
const wordsOfTheYard = ['coilyard', 'crystal set', 'crystalset', 'designer', 'checker', 'packer', 'owner', 'receiver'];

/**
 * What is wrong with a new password, or null. Length carries it; a password that is little more than a word everybody
 * tries is refused. No composition rules, no trimming, every character counts as typed.
 */
export function passwordFault(
  password: string,
  kind: 'staff' | 'customer',
  own: readonly string[] = [],
): string | null {
  const least = passwordLength[kind];
  const length = [...password].length;
  if (length < least)
    return `Short by ${least - length}: a password has at least ${least} characters. Four odd words do well.`;
  if (length > passwordLength.most)
    return `Too long by ${length - passwordLength.most}: at most ${passwordLength.most} characters.`;
  const lower = password.normalize('NFKC').toLowerCase();
  if (new Set(lower).size < 4 || isRun(lower))
    return 'This is one of the first that a stranger would try. Take four odd words.';
  const known = [...guessedFirst, ...wordsOfTheYard, ...own.map((word) => word.toLowerCase())];
  const word = known
    .filter((one) => one.length >= 4)
    .find((one) => lower.includes(one) && lower.length - one.length < least);
  return word === undefined
    ? null
    : `"${word}" is one of the first words that a stranger would try. Take four odd words instead.`;
}

/** "123456789", "abcdefgh", "987654": each character next to the one before. */
function isRun(text: string): boolean {
  const steps = [...text].slice(1).map((character, index) => character.charCodeAt(0) - text.charCodeAt(index));
  // Nought follows nine on every keyboard.
  return steps.every((step) => step === 1 || step === -9) || steps.every((step) => step === -1 || step === 9);
}

/** After the third failure each further one doubles the wait, from a second to a quarter of an hour. Never for good. */
export function waitAfter(failures: number): number {
  const free = 3;
  return failures < free ? 0 : Math.min(1000 * 2 ** Math.min(failures - free, 20), minutes(15));
}

/** How often a quarter of an hour or an hour allows something, whoever it is for. */
export const allowance = {
  signInFromAddress: { most: 100, window: minutes(15) },
  linkForAccount: { most: 5, window: minutes(60) },
  linkFromAddress: { most: 20, window: minutes(60) },
  orderFromAddress: { most: 30, window: minutes(60) },
} as const;

export const windowOf = (at: Instant, window: number) => Math.floor(at / window);

/**
 * A path of ours to go to after signing in, or null: one leading slash, nothing that a browser reads as another host.
 * Parsing decides, and the parsed form is what is used.
 */
export function safePath(text: string | null | undefined): string | null {
  if (!text || text.length > 2000 || !/^\/(?![/\\])[\x21-\x7e]*$/.test(text)) return null;
  if (/[\\]|%(?:2f|5c|0[0-9a-f]|1[0-9a-f]|7f)/i.test(text)) return null;
  const ours = 'http://yard.invalid';
  try {
    const url = new URL(text, ours);
    return url.origin === ours && !url.pathname.startsWith('//') ? url.pathname + url.search + url.hash : null;
  } catch {
    return null;
  }
}

/** The room somebody starts in. Several roles: the one whose work waits for others comes first. */
export function firstScreen(person: { kind: 'staff' | 'customer'; roles: readonly Role[] }): string {
  if (person.kind === 'customer') return '/orders';
  const rooms: readonly [Role, string][] = [
    ['owner', '/desk'],
    ['checker', '/check'],
    ['designer', '/bench'],
    ['packer', '/packing'],
  ];
  return rooms.find(([role]) => person.roles.includes(role))?.[1] ?? '/account';
}

/** Why roles cannot be changed so; empty when they can. */
export function rolesBlockers(change: {
  isSelf: boolean;
  before: readonly Role[];
  after: readonly Role[];
  ownersLeft: number;
}): string[] {
  const losesOwner = change.before.includes('owner') && !change.after.includes('owner');
  if (losesOwner && change.isSelf) return ['You cannot take the owner role from yourself. Ask another owner to do it.'];
  if (losesOwner && change.ownersLeft === 0) return ['The yard needs one owner. Give somebody else the role first.'];
  return [];
}

/** What the sign-in page says for an answer of the sign-in route. What does not fit has one sentence, whatever it was. */
export function signInSentence(code: string): string {
  const wait = /^wait-(\d{1,4})$/.exec(code);
  if (wait) return `Too many tries. Wait ${showWait(Number(wait[1]))}, then try again. Nothing is locked.`;
  const sentences: Record<string, string> = {
    CredentialsSignin:
      'That does not fit. Check the address and the password; staff also need the six figures of the moment.',
    'link-used':
      'This link does not work here. It works once, for ten minutes, in the browser that asked for it. Ask for a new one.',
    busy: 'The yard is busy just now. Nothing was lost; try again in a moment.',
  };
  return sentences[code] ?? 'Signing in did not work just now. Nothing was lost; try again in a moment.';
}

function showWait(seconds: number): string {
  if (seconds <= 90) return seconds === 1 ? '1 second' : `${seconds} seconds`;
  return `${Math.ceil(seconds / 60)} minutes`;
}
