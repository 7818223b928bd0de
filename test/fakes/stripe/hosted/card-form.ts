import { grouped, hasCheckDigit, testCard, type TestCard } from '../cards';
import type { Expiry } from '../payments';

export type Field = 'email' | 'number' | 'expiry' | 'cvc' | 'name';

/** What stands in the form again after an error; never the card number or the security code. */
export interface Kept {
  email: string;
  expiry: string;
  name: string;
  last4: string;
}

export type Wrong = Partial<Record<Field, string>>;

export type CardForm = { kept: Kept } & (
  { ok: true; card: TestCard; expiry: Expiry; email: string | null; name: string | null } | { ok: false; wrong: Wrong }
);

export function readCardForm(form: URLSearchParams, knownEmail: string | null, now: Date): CardForm {
  const said = (field: Field) => (form.get(field) ?? '').trim().slice(0, 200);
  const number = said('number').replace(/[\s-]/g, '');
  const kept: Kept = {
    email: said('email'),
    expiry: said('expiry').slice(0, 10),
    name: said('name'),
    last4: /^\d{8,}$/.test(number) ? number.slice(-4) : '',
  };
  const card = testCard(number);
  const expiry = readExpiry(kept.expiry, now);
  const email = knownEmail ?? kept.email;
  const wrong: Wrong = {
    ...(!/^[^\s@]+@[^\s@]+$/.test(email) && { email: 'Enter an e-mail address, such as ada@example.org.' }),
    ...(!card && { number: aboutNumber(number) }),
    ...(typeof expiry === 'string' && { expiry }),
    ...(!/^\d{3,4}$/.test(said('cvc')) && { cvc: 'Enter the three or four digits of the security code.' }),
  };
  if (!card || typeof expiry === 'string' || Object.keys(wrong).length > 0) return { ok: false, kept, wrong };
  return { ok: true, kept, card, expiry, email, name: kept.name === '' ? null : kept.name };
}

function aboutNumber(number: string): string {
  if (number === '') return 'Enter a card number from the list of test cards.';
  if (!hasCheckDigit(number))
    return 'This is not a card number: a digit is missing or wrong. Take one from the list of test cards.';
  return `Only test cards work here, and nothing would be taken from a real one. Try ${grouped('4242424242424242')}.`;
}

/** "12/34", "12 / 2034", "1234"; a card is good to the end of its month. */
function readExpiry(text: string, now: Date): Expiry | string {
  const parts = /^(\d{1,2})\s*\/?\s*(\d{2}|\d{4})$/.exec(text);
  const month = Number(parts?.[1]);
  const year = Number(parts?.[2]?.padStart(4, '20'));
  if (!parts || month < 1 || month > 12) return 'Enter month and year, such as 12 / 34.';
  const past = year * 12 + month < now.getUTCFullYear() * 12 + now.getUTCMonth() + 1;
  return past ? 'This date is in the past. Enter any date to come.' : { month, year };
}
