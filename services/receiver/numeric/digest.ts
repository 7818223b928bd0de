import { utf8 } from './random';

/** A JSON text in the one form of RFC 8785: keys by UTF-16 units, numbers and strings as ECMAScript writes them. */
export function canonicalJson(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map((item) => canonicalJson(item ?? null)).join(',')}]`;
  if (value !== null && typeof value === 'object') {
    const entries = Object.entries(value).filter(([, item]) => item !== undefined);
    entries.sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0));
    return `{${entries.map(([key, item]) => `${JSON.stringify(key)}:${canonicalJson(item)}`).join(',')}}`;
  }
  return JSON.stringify(value ?? null);
}

/** First 32 bits of the fractional part of a root of a small prime, found by whole numbers: FIPS 180-4, 4.2.2, 5.3.3. */
function rootBits(prime: number, power: 2 | 3): number {
  const target = BigInt(prime) << (power === 2 ? 64n : 96n);
  let low = 0n;
  let high = 1n << 40n;
  while (high - low > 1n) {
    const middle = (low + high) >> 1n;
    const raised = power === 2 ? middle * middle : middle * middle * middle;
    if (raised <= target) low = middle;
    else high = middle;
  }
  return Number(low & 0xffffffffn);
}

interface Constants {
  start: number[];
  round: number[];
}

let constants: Constants | null = null;

function constantsOnce(): Constants {
  if (constants !== null) return constants;
  const primes: number[] = [];
  for (let n = 2; primes.length < 64; n += 1) if (primes.every((p) => n % p !== 0)) primes.push(n);
  constants = { start: primes.slice(0, 8).map((p) => rootBits(p, 2)), round: primes.map((p) => rootBits(p, 3)) };
  return constants;
}

function rotated(word: number, by: number): number {
  return (word >>> by) | (word << (32 - by));
}

/** SHA-256 of a text's UTF-8 bytes, in hexadecimal (FIPS 180-4). */
export function sha256(text: string): string {
  const { start, round } = constantsOnce();
  const bytes = utf8(text);
  const bits = bytes.length * 8;
  bytes.push(0x80);
  while (bytes.length % 64 !== 56) bytes.push(0);
  for (let shift = 56; shift >= 0; shift -= 8) {
    bytes.push(shift >= 32 ? (Math.floor(bits / 4294967296) >>> (shift - 32)) & 255 : (bits >>> shift) & 255);
  }
  const state = [...start];
  const words = new Int32Array(64);
  const word = (i: number): number => words[i] ?? 0;
  for (let block = 0; block < bytes.length; block += 64) {
    for (let i = 0; i < 16; i += 1) {
      const from = block + 4 * i;
      const byte = (k: number): number => bytes[from + k] ?? 0;
      words[i] = (byte(0) << 24) | (byte(1) << 16) | (byte(2) << 8) | byte(3);
    }
    for (let i = 16; i < 64; i += 1) {
      const a = word(i - 15);
      const b = word(i - 2);
      const s0 = rotated(a, 7) ^ rotated(a, 18) ^ (a >>> 3);
      const s1 = rotated(b, 17) ^ rotated(b, 19) ^ (b >>> 10);
      words[i] = (word(i - 16) + s0 + word(i - 7) + s1) | 0;
    }
    let [a = 0, b = 0, c = 0, d = 0, e = 0, f = 0, g = 0, h = 0] = state;
    for (let i = 0; i < 64; i += 1) {
      const s1 = rotated(e, 6) ^ rotated(e, 11) ^ rotated(e, 25);
      const choice = (e & f) ^ (~e & g);
      const t1 = (h + s1 + choice + (round[i] ?? 0) + word(i)) | 0;
      const s0 = rotated(a, 2) ^ rotated(a, 13) ^ rotated(a, 22);
      const majority = (a & b) ^ (a & c) ^ (b & c);
      [h, g, f, e, d, c, b, a] = [g, f, e, (d + t1) | 0, c, b, a, (t1 + s0 + majority) | 0];
    }
    const mixed = [a, b, c, d, e, f, g, h];
    for (let i = 0; i < 8; i += 1) state[i] = ((state[i] ?? 0) + (mixed[i] ?? 0)) | 0;
  }
  return state.map((part) => (part >>> 0).toString(16).padStart(8, '0')).join('');
}
