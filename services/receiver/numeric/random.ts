/** Streams of mulberry32 (public domain): 32-bit integer steps only, so the same bits everywhere. */

/** FNV-1a, 32 bit, of the UTF-8 bytes of a text. */
export function fnv1a(text: string): number {
  let hash = 0x811c9dc5;
  for (const byte of utf8(text)) hash = Math.imul(hash ^ byte, 0x01000193);
  return hash >>> 0;
}

/** Seed of a value's own stream, so that a value more or less leaves the draws of the others alone. */
export function streamSeed(seed: number, path: string): number {
  return (seed ^ fnv1a(path)) >>> 0;
}

/** One step: mixes the state already moved on by `advance`. */
export function mulberry32(state: number): number {
  let t = Math.imul(state ^ (state >>> 15), state | 1);
  t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
  return (t ^ (t >>> 14)) >>> 0;
}

/** The state after one draw. */
export function advance(state: number): number {
  return (state + 0x6d2b79f5) >>> 0;
}

/** A draw in (0, 1), never an end. */
export function unitDraw(bits: number): number {
  return (bits + 0.5) / 4294967296;
}

/** UTF-8 bytes of a text; a lone surrogate becomes the replacement character. */
export function utf8(text: string): number[] {
  const bytes: number[] = [];
  for (const sign of text) {
    let code = sign.codePointAt(0) ?? 0xfffd;
    if (code >= 0xd800 && code <= 0xdfff) code = 0xfffd;
    if (code < 0x80) bytes.push(code);
    else if (code < 0x800) bytes.push(0xc0 | (code >> 6), 0x80 | (code & 63));
    else if (code < 0x10000) bytes.push(0xe0 | (code >> 12), 0x80 | ((code >> 6) & 63), 0x80 | (code & 63));
    else bytes.push(0xf0 | (code >> 18), 0x80 | ((code >> 12) & 63), 0x80 | ((code >> 6) & 63), 0x80 | (code & 63));
  }
  return bytes;
}
