import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  checkCharacter,
  guideCode,
  isSerial,
  looksLikeSerial,
  readGuideCode,
  serialOf,
} from '@/services/packing/serial';
import cases from '../../reference/kit-trade.checks.json';

const alphabet = [...'0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ'];
const body = fc.array(fc.constantFrom(...alphabet), { minLength: 4, maxLength: 16 }).map((letters) => letters.join(''));

describe('the check character of a box serial (ISO 7064 MOD 37,36)', () => {
  const published = cases.cases.filter((one) => one.topic === 'iso7064-mod37-36');

  it('agrees with every reference case', () => {
    expect(published.length).toBeGreaterThan(1);
    for (const { inputs, expected } of published) {
      expect(checkCharacter('text' in inputs ? String(inputs.text) : '')).toBe(expected);
    }
  });

  it('finds every single wrong character', () => {
    fc.assert(
      fc.property(body, fc.nat(), fc.constantFrom(...alphabet), (text, at, other) => {
        const place = at % text.length;
        fc.pre(text.charAt(place) !== other);
        const misread = text.slice(0, place) + other + text.slice(place + 1);
        expect(checkCharacter(misread)).not.toBe(checkCharacter(text));
      }),
    );
  });

  it('misses fewer than one in six hundred swaps of neighbours, counted over all of them', () => {
    let missed = 0;
    let all = 0;
    // Heads of one character reach every state of the computation, so all pairs behind all of them are all swaps.
    for (const head of alphabet) {
      for (const a of alphabet) {
        for (const b of alphabet) {
          if (a === b) continue;
          all += 1;
          if (checkCharacter(head + a + b) === checkCharacter(head + b + a)) missed += 1;
        }
      }
    }
    expect(all).toBe(36 * 36 * 35);
    expect(missed).toBe(72);
  });
});

describe('a box serial', () => {
  it('is kit code, letter, six digits and the check character', () => {
    expect(serialOf('MW1', 'C', 123)).toBe('MW1C000123H');
    expect(isSerial('MW1C000123H')).toBe(true);
  });

  it('is known as read badly when its check character does not fit', () => {
    expect(isSerial('MW1C000124H')).toBe(false);
    expect(looksLikeSerial('MW1C000124H')).toBe(true);
    expect(looksLikeSerial('L-0007')).toBe(false);
  });
});

it('a guide names the content it was made from and the box it was made for', () => {
  const code = guideCode('7f41b2c09a', 'MW1C000123H');
  expect(code).toBe('G7F41B2C0-MW1C000123H');
  expect(readGuideCode(code)).toEqual({ hash: '7F41B2C0', serial: 'MW1C000123H' });
  expect(readGuideCode('GUIDE')).toBeNull();
});
