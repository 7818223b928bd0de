import { InvalidInput } from '../invalid-input';
import { tenTo } from './preferred';

const COLOURS = ['black', 'brown', 'red', 'orange', 'yellow', 'green', 'blue', 'violet', 'grey', 'white'];
const EXTRA_POWERS: Record<string, number> = { gold: -1, silver: -2, pink: -3 };
const COLOUR_TOLERANCE: Record<string, number> = {
  brown: 0.01,
  red: 0.02,
  orange: 0.0005,
  yellow: 0.0002,
  green: 0.005,
  blue: 0.0025,
  violet: 0.001,
  grey: 0.0001,
  gold: 0.05,
  silver: 0.1,
};

function refuse(path: string, message: string): never {
  throw new InvalidInput([{ path, message }]);
}

/** digits x 10^power from whole numbers only, so that 4K7 is 4700 and not 4.7 x 1000. */
function composed(digits: number, power: number): number {
  return power >= 0 ? digits * tenTo(power) : digits / tenTo(-power);
}

/** Value and tolerance of a resistor from its colour bands, 3 to 6 (IEC 60062). Three bands mean 20 %. */
export function colours(bands: readonly string[]): { value: number; tolerance: number } {
  if (bands.length < 3 || bands.length > 6) refuse('bands', 'A resistor has three to six bands.');
  const digitCount = bands.length >= 5 ? 3 : 2;
  let digits = 0;
  for (const band of bands.slice(0, digitCount)) {
    const digit = COLOURS.indexOf(band);
    if (digit < 0) refuse('bands', `${band} is no digit: read the bands from the other end.`);
    digits = digits * 10 + digit;
  }
  if (bands[0] === 'black') refuse('bands', 'The first band is never black: read the bands from the other end.');
  const multiplier = bands[digitCount] ?? '';
  const power = COLOURS.includes(multiplier) ? COLOURS.indexOf(multiplier) : EXTRA_POWERS[multiplier];
  if (power === undefined) refuse('bands', `${multiplier} is no multiplier.`);
  const last = bands[digitCount + 1];
  const tolerance = last === undefined ? 0.2 : COLOUR_TOLERANCE[last];
  if (tolerance === undefined) refuse('bands', `${String(last)} is no tolerance.`);
  return { value: composed(digits, power), tolerance };
}

const LETTER_TOLERANCE: Record<string, number> = {
  E: 0.00005,
  L: 0.0001,
  P: 0.0002,
  W: 0.0005,
  B: 0.001,
  C: 0.0025,
  D: 0.005,
  F: 0.01,
  G: 0.02,
  H: 0.03,
  J: 0.05,
  K: 0.1,
  M: 0.2,
  N: 0.3,
};

/** Tolerance of a letter (IEC 60062), for values that are not below 10 pF. */
export function toleranceOf(letter: string): number {
  return LETTER_TOLERANCE[letter] ?? refuse('letter', `${letter} is no symmetric tolerance letter.`);
}

const RESISTANCE_POWER: Record<string, number> = { L: -3, R: 0, K: 3, k: 3, M: 6, G: 9 };
const CAPACITANCE_POWER: Record<string, number> = { p: -12, n: -9, u: -6, '\u00b5': -6, '\u03bc': -6, m: -3, F: 0 };
const RESISTANCE = /^(\d*)([LRKkMG])(\d*)([A-Z])?$/;
const CAPACITANCE = /^(\d*)([pnu\u00b5\u03bcmF])(\d*)([A-Z])?$/;

/** Value of a letter-and-digit mark (IEC 60062): 4K7, R47, 4n7, p68. Refuses what a person types in a quantity field. */
export function parseCode(code: string, kind: 'resistance' | 'capacitance'): number {
  const parts = (kind === 'resistance' ? RESISTANCE : CAPACITANCE).exec(code);
  const [, before = '', letter = '', after = '', tolerance] = parts ?? [];
  if (parts === null || before + after === '')
    refuse('code', `${code} is no mark of this kind: it reads like 4K7 or 4n7.`);
  if (kind === 'capacitance' && tolerance === 'F' && after === '') {
    refuse('code', `F would read as 1 % here: write ${before}${letter}.`);
  }
  const power = (kind === 'resistance' ? RESISTANCE_POWER : CAPACITANCE_POWER)[letter] ?? 0;
  return composed(Number(before + after), power - after.length);
}

/** Value in farad of a three-digit mark: two digits and a power of ten in pF; 8 stands for 0.01, 9 for 0.1. */
export function threeDigit(code: string): number {
  if (!/^\d{3}$/.test(code)) refuse('code', `${code} is no three-digit mark: it reads like 104.`);
  const last = Number(code[2]);
  const power = last === 8 ? -2 : last === 9 ? -1 : last;
  return composed(Number(code.slice(0, 2)), power - 12);
}
