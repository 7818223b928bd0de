import { createHash } from 'node:crypto';

/**
 * Canonical text of a JSON value (RFC 8785: keys sorted by UTF-16 code units, no blanks, ECMAScript numbers), so that
 * equal content always hashes alike.
 */
export function canonicalJson(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map((item) => canonicalJson(item ?? null)).join(',')}]`;
  if (typeof value === 'object' && value !== null) {
    const members = Object.entries(value)
      .filter(([, member]) => member !== undefined)
      .sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0))
      .map(([key, member]) => `${JSON.stringify(key)}:${canonicalJson(member)}`);
    return `{${members.join(',')}}`;
  }
  if (typeof value === 'number' && !Number.isFinite(value))
    throw new RangeError('No canonical form for a number that is not finite.');
  return JSON.stringify(value ?? null);
}

export const sha256 = (text: string) => createHash('sha256').update(text, 'utf8').digest('hex');
