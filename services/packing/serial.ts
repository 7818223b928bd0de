/**
 * Box serials: kit code, version letter, six digits, and a check character by ISO 7064 MOD 37,36, which finds every
 * single wrong character, all but one in 630 of the swaps of neighbours, and is never a star (kit-trade e.3).
 */
const alphabet = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ';

/** @throws RangeError for a character outside 0-9 A-Z */
export function checkCharacter(text: string): string {
  return alphabet.charAt((37 - remainder(text)) % 36);
}

/** The product before the check character is added: hybrid system with moduli 37 and 36, beginning at 36. */
function remainder(text: string): number {
  let product = 36;
  for (const character of text) {
    const value = alphabet.indexOf(character);
    if (value < 0) throw new RangeError(`"${character}" has no place in a serial.`);
    product = (((product + value) % 36 || 36) * 2) % 37;
  }
  return product;
}

export function serialOf(kitCode: string, letter: string, count: number): string {
  const body = `${kitCode}${letter}${String(count).padStart(6, '0')}`;
  return body + checkCharacter(body);
}

/** Says whether a text has the form of a serial at all: enough to tell "read wrongly" from "some other code". */
const serialForm = /^[A-HJ-NP-Z][A-HJ-NP-Z0-9]{1,5}[A-Z]{1,2}[0-9]{6}[0-9A-Z]$/;

export const looksLikeSerial = (text: string) => serialForm.test(text);

export const isSerial = (text: string) => looksLikeSerial(text) && checkCharacter(text.slice(0, -1)) === text.slice(-1);

/** The code that a printed guide carries: it names the content it was made from and the box it was made for. */
export const guideCode = (contentHash: string, serial: string) => `G${shortHash(contentHash)}-${serial}`;

/** First eight characters: two papers with the same letters came from the same content. */
export const shortHash = (contentHash: string) => contentHash.slice(0, 8).toUpperCase();

const guideForm = /^G([0-9A-F]{8})-([0-9A-Z]{8,16})$/;

export function readGuideCode(text: string): { hash: string; serial: string } | null {
  const [, hash, serial] = guideForm.exec(text) ?? [];
  return hash !== undefined && serial !== undefined ? { hash, serial } : null;
}
