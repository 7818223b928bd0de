/** Letters that the printed faces hold: Latin with its marks, the punctuation of prose, and the signs of units. */
const held = /^[\n\u0020-\u024f\u1e00-\u1eff\u2009\u2010-\u2027\u202f\u2030-\u203a\u20ac\u2212\u03a9\u03bc\u03c0]$/u;

/**
 * A text as it can be printed. A letter that no face of ours holds would be set in one that is not in the file; it loses
 * its marks, and where that does not help a question mark shows that something is missing.
 */
export function printable(text: string): string {
  const signs = text
    .normalize('NFC')
    .replace(/\u00b5/g, '\u03bc')
    .replace(/\u2126/g, '\u03a9');
  let printed = '';
  for (const letter of signs) {
    const bare = letter.normalize('NFKD').replace(/\p{M}/gu, '');
    printed += held.test(letter) ? letter : [...bare].every((part) => held.test(part)) ? bare : '?';
  }
  return printed;
}
