type CardOutcome =
  | { kind: 'pays' }
  | { kind: 'disputes' }
  | { kind: 'asks' }
  | { kind: 'refused'; code: string; declineCode?: string; sentence: string };

export interface TestCard {
  number: string;
  brand: 'visa' | 'mastercard';
  hint: string;
  outcome: CardOutcome;
}

const refused = (code: string, declineCode: string | undefined, sentence: string): CardOutcome => ({
  kind: 'refused',
  code,
  ...(declineCode && { declineCode }),
  sentence,
});

/** The provider's published test numbers, as far as a kit shop meets what they stand for. */
export const TEST_CARDS: readonly TestCard[] = [
  { number: '4242424242424242', brand: 'visa', hint: 'pays', outcome: { kind: 'pays' } },
  { number: '5555555555554444', brand: 'mastercard', hint: 'pays', outcome: { kind: 'pays' } },
  { number: '4000002500003155', brand: 'visa', hint: 'asks for authentication', outcome: { kind: 'asks' } },
  { number: '4000002760003184', brand: 'visa', hint: 'asks for authentication each time', outcome: { kind: 'asks' } },
  {
    number: '4000000000000002',
    brand: 'visa',
    hint: 'the bank says no',
    outcome: refused('card_declined', 'generic_decline', 'Your bank said no. Nothing was taken. Try another card.'),
  },
  {
    number: '4000000000009995',
    brand: 'visa',
    hint: 'not enough money',
    outcome: refused(
      'card_declined',
      'insufficient_funds',
      'There is not enough money on this card. Nothing was taken. Try another card.',
    ),
  },
  {
    number: '4000000000000069',
    brand: 'visa',
    hint: 'expired',
    outcome: refused('expired_card', undefined, 'This card has expired. Nothing was taken. Try another card.'),
  },
  {
    number: '4000000000000127',
    brand: 'visa',
    hint: 'wrong security code',
    outcome: refused('incorrect_cvc', undefined, 'The security code is wrong. Nothing was taken. Type it again.'),
  },
  {
    number: '4000000000000119',
    brand: 'visa',
    hint: 'trouble at the bank',
    outcome: refused(
      'processing_error',
      undefined,
      'The bank could not handle this card now. Nothing was taken. Try again.',
    ),
  },
  {
    number: '4000000000000259',
    brand: 'visa',
    hint: 'pays, then the holder disputes it',
    outcome: { kind: 'disputes' },
  },
];

export function testCard(number: string): TestCard | undefined {
  return TEST_CARDS.find((card) => card.number === number);
}

/** Luhn's check digit: every second digit from the right counts double, digit by digit; the sum ends in 0. */
export function hasCheckDigit(number: string): boolean {
  const sum = [...number].reverse().reduce((total, digit, index) => {
    const counted = index % 2 === 0 ? Number(digit) : Number(digit) * 2;
    return total + (counted > 9 ? counted - 9 : counted);
  }, 0);
  return /^\d{12,19}$/.test(number) && sum % 10 === 0;
}

export function grouped(number: string): string {
  return number.replace(/(\d{4})(?=\d)/g, '$1 ');
}
