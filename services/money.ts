import { z } from 'zod';

/** ISO 4217 exponents of the currencies a price may be in (table A.1; extend with the currency). */
const exponents = { GBP: 2, EUR: 2, USD: 2, JPY: 0 } as const;
const signs: Record<Currency, string> = { GBP: '£', EUR: '€', USD: '$', JPY: '¥' };

export const Currency = z.enum(['GBP', 'EUR', 'USD', 'JPY']);
export type Currency = z.infer<typeof Currency>;

export const Money = z.strictObject({ minor: z.int(), currency: Currency });
export type Money = z.infer<typeof Money>;

export const money = (minor: number, currency: Currency): Money => ({ minor, currency });

/** "£1,234.50"; minus is U+2212 so that it lines up with the figures. */
export function formatMoney({ minor, currency }: Money): string {
  const exponent = exponents[currency];
  const digits = Math.abs(minor)
    .toString()
    .padStart(exponent + 1, '0');
  const whole = digits.slice(0, digits.length - exponent).replace(/\B(?=(\d{3})+$)/g, ',');
  const rest = exponent > 0 ? `.${digits.slice(digits.length - exponent)}` : '';
  return `${minor < 0 ? '\u2212' : ''}${signs[currency]}${whole}${rest}`;
}

/** Reads "24.90" or "24"; refuses more decimals than the currency has, exponents, and commas. */
export function parseMoney(text: string, currency: Currency): Money | null {
  const exponent = exponents[currency];
  const match = /^(-?)(\d{1,10})(?:\.(\d+))?$/.exec(text.trim());
  if (!match) return null;
  const [, sign, whole = '0', decimals = ''] = match;
  if (decimals.length > exponent) return null;
  const minor = Number(whole + decimals.padEnd(exponent, '0'));
  return { minor: sign === '-' ? 0 - minor : minor, currency };
}

export function times(price: Money, count: number): Money {
  return money(price.minor * count, price.currency);
}

export function sum(amounts: readonly Money[], currency: Currency): Money {
  let minor = 0;
  for (const amount of amounts) {
    if (amount.currency !== currency) throw new RangeError(`Cannot add ${amount.currency} to ${currency}.`);
    minor += amount.minor;
  }
  return money(minor, currency);
}

/** Integer division rounded half up, mirrored below zero, so that a full refund equals its sale. */
function divideHalfUp(numerator: number, denominator: number): number {
  const sign = numerator < 0 ? -1 : 1;
  const size = Math.abs(numerator);
  const whole = Math.floor(size / denominator);
  return sign * (whole + ((size % denominator) * 2 >= denominator ? 1 : 0));
}

/** The tax inside a price that includes it: gross x rate / (100 % + rate), rate in basis points (20 % = 2000). */
export function taxWithin(gross: Money, basisPoints: number): Money {
  return money(divideHalfUp(gross.minor * basisPoints, 10_000 + basisPoints), gross.currency);
}

/** Splits an amount by weights so that the shares add up to it: the largest remainders take what is left over. */
export function shareOut(amount: Money, weights: readonly number[]): Money[] {
  const total = weights.reduce((all, weight) => all + weight, 0);
  if (total <= 0) throw new RangeError('Weights must add up to more than zero.');
  const exact = weights.map((weight) => (amount.minor * weight) / total);
  const shares = exact.map(Math.floor);
  const left = amount.minor - shares.reduce((all, share) => all + share, 0);
  const byRemainder = exact
    .map((value, index) => ({ index, remainder: value - Math.floor(value) }))
    .sort((a, b) => b.remainder - a.remainder || a.index - b.index);
  for (const { index } of byRemainder.slice(0, left)) shares[index] = (shares[index] ?? 0) + 1;
  return shares.map((minor) => money(minor, amount.currency));
}
