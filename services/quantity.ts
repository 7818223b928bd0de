/**
 * Reads and prints quantities as people write them. Values are SI numbers everywhere else; prefixes exist only here.
 * A field knows its unit: a bare "235" in a field of μH is 235 μH, and "235u", "0.235m" or "235 uH" say the same.
 */

type Dimension = 'F' | 'H' | 'Ω' | 'm' | 'Hz' | 'V' | 'A' | 'W' | 'V/m' | '%' | '°' | 'g' | '1';

/** Units that fields show, with what one of them is in SI (a percent is a hundredth, a degree stays one). */
const shown = {
  pF: { dimension: 'F', size: 1e-12 },
  nF: { dimension: 'F', size: 1e-9 },
  μH: { dimension: 'H', size: 1e-6 },
  Ω: { dimension: 'Ω', size: 1 },
  kΩ: { dimension: 'Ω', size: 1e3 },
  MΩ: { dimension: 'Ω', size: 1e6 },
  μm: { dimension: 'm', size: 1e-6 },
  mm: { dimension: 'm', size: 1e-3 },
  m: { dimension: 'm', size: 1 },
  kHz: { dimension: 'Hz', size: 1e3 },
  V: { dimension: 'V', size: 1 },
  nA: { dimension: 'A', size: 1e-9 },
  μA: { dimension: 'A', size: 1e-6 },
  pW: { dimension: 'W', size: 1e-12 },
  'mV/m': { dimension: 'V/m', size: 1e-3 },
  '%': { dimension: '%', size: 1e-2 },
  '°': { dimension: '°', size: 1 },
  g: { dimension: 'g', size: 1 },
  '': { dimension: '1', size: 1 },
} as const satisfies Record<string, { dimension: Dimension; size: number }>;

export type ShownUnit = keyof typeof shown;

const prefixes: Record<string, number> = { p: 1e-12, n: 1e-9, u: 1e-6, m: 1e-3, '': 1, k: 1e3, M: 1e6, G: 1e9 };

/** How a dimension's unit may be written after the prefix; the first is ours. */
const spellings: Record<Dimension, readonly string[]> = {
  F: ['F'],
  H: ['H', 'Hy'],
  Ω: ['Ω', 'ohm', 'ohms', 'R'],
  m: ['m'],
  Hz: ['Hz'],
  V: ['V'],
  A: ['A'],
  W: ['W'],
  'V/m': ['V/m'],
  '%': ['%'],
  '°': ['°', 'deg', 'degrees'],
  g: ['g'],
  1: [''],
};

export type Reading = { ok: true; value: number; understood: string } | { ok: false; sentence: string };

/** Reads what was typed into a field of this unit. */
export function readQuantity(text: string, unit: ShownUnit): Reading {
  const typed = tidy(text);
  if (typed === '') return { ok: false, sentence: `Give a value in ${unit || 'figures'}.` };
  const value = inches(typed, unit) ?? gauge(typed, unit) ?? suffixed(typed, unit) ?? coded(typed, unit);
  if (value === null || !Number.isFinite(value)) return { ok: false, sentence: unread(text, unit) };
  return { ok: true, value: clean(value), understood: showQuantity(value, unit) };
}

function unread(text: string, unit: ShownUnit): string {
  const example = { F: '365p', H: '235u', Ω: '4k7', m: unit === 'mm' ? '0.3 mm' : '12.5 m' }[
    String(shown[unit].dimension)
  ];
  return `"${text.trim()}" is not a value in ${unit || 'figures'}.${example === undefined ? '' : ` Write it like ${example}.`}`;
}

/** One decimal point, one sort of micro sign, no grouping blanks. */
function tidy(text: string): string {
  return text
    .trim()
    .replace(/[\u2212\u2013]/g, '-')
    .replace(/[\u00b5\u03bc]/g, 'u')
    .replace(/\u2126/g, 'Ω')
    .replace(/(\d)[ \u00a0\u2009\u202f](?=\d{3}(\D|$))/g, '$1')
    .replace(/(\d),(\d)/g, '$1.$2');
}

/** "235", "235u", "0.235 mH", "365 pF": a number, then perhaps a prefix, then perhaps the unit. */
function suffixed(typed: string, unit: ShownUnit): number | null {
  const match = /^(-?\d*\.?\d+(?:e-?\d+)?)\s*(.*)$/i.exec(typed);
  if (!match) return null;
  const [, figures = '', after = ''] = match;
  const { dimension, size } = shown[unit];
  const number = Number(figures);
  const tail = after.trim();
  if (tail === '') return number * size;
  if (dimension === 'm') return lengthTail(number, tail);
  for (const spelling of spellings[dimension]) {
    const scale = prefixOf(tail, spelling);
    if (scale !== null) return number * scale * (dimension === '%' ? 0.01 : 1);
  }
  const alone = prefixOf(`${tail}|`, '|');
  return alone === null || !takesPrefix(dimension) ? null : number * alone;
}

/** A length's "m" alone is the metre, so a prefix has to stand before it. */
function lengthTail(number: number, tail: string): number | null {
  if (tail === 'cm') return number * 1e-2;
  const scale = prefixOf(tail, 'm');
  return scale === null ? (tail === 'u' ? number * 1e-6 : null) : number * scale;
}

function prefixOf(tail: string, spelling: string): number | null {
  if (!tail.toLowerCase().endsWith(spelling.toLowerCase())) return null;
  const prefix = tail.slice(0, tail.length - spelling.length).trim();
  return prefixes[prefix === 'K' ? 'k' : prefix] ?? null;
}

const takesPrefix = (dimension: Dimension) => !['m', '%', '°', 'g', '1'].includes(dimension);

/** "4n7", "4K7", "4R7": the letter stands for the decimal point. */
function coded(typed: string, unit: ShownUnit): number | null {
  const match = /^(\d*)([pnumkKMGR])(\d+)\s*(.*)$/.exec(typed);
  const { dimension } = shown[unit];
  if (!match || !takesPrefix(dimension)) return null;
  const [, whole = '', letter = '', decimals = '', after = ''] = match;
  if (after !== '' && !spellings[dimension].some((one) => one.toLowerCase() === after.toLowerCase())) return null;
  if (letter === 'R' && dimension !== 'Ω') return null;
  const scale = letter === 'R' ? 1 : prefixes[letter === 'K' ? 'k' : letter];
  return scale === undefined ? null : Number(`${whole || '0'}.${decimals}`) * scale;
}

const INCH = 0.0254;

function inches(typed: string, unit: ShownUnit): number | null {
  if (shown[unit].dimension !== 'm') return null;
  const match = /^(\d*\.?\d+)\s*(?:in|inch|inches|")$/i.exec(typed);
  return match ? Number(match[1]) * INCH : null;
}

/** "26 AWG" and "24 SWG" are bare wire diameters. A gauge number alone is never taken as one. */
function gauge(typed: string, unit: ShownUnit): number | null {
  if (shown[unit].dimension !== 'm') return null;
  const match = /^(?:(\d{1,2})\s*(awg|swg)|(awg|swg)\s*(\d{1,2}))$/i.exec(typed);
  if (!match) return null;
  const number = Number(match[1] ?? match[4]);
  const system = (match[2] ?? match[3] ?? '').toUpperCase();
  if (system === 'AWG') return 0.127e-3 * 92 ** ((36 - number) / 39);
  const thousandths = standardWireGauge[number];
  return thousandths === undefined ? null : thousandths * INCH * 1e-3;
}

/** Standard wire gauge, thousandths of an inch (a fixed table; no formula gives it). */
const standardWireGauge: Record<number, number> = {
  14: 80, 15: 72, 16: 64, 17: 56, 18: 48, 19: 40, 20: 36, 21: 32, 22: 28, 23: 24, 24: 22, 25: 20, 26: 18, 27: 16.4,
  28: 14.8, 29: 13.6, 30: 12.4, 31: 11.6, 32: 10.8, 33: 10, 34: 9.2, 35: 8.4, 36: 7.6, 37: 6.8, 38: 6, 39: 5.2, 40: 4.8,
}; // prettier-ignore

/** The figures of a value in this unit, as a field shows them for editing: "365", "0.3". */
export function figuresIn(value: number, unit: ShownUnit): string {
  return String(clean(value / shown[unit].size)).replace('e+', 'e');
}

/** "235 μH", "26.5 %", "1602 kHz": the value in this unit, with a thin gap before the unit. */
export function showQuantity(value: number, unit: ShownUnit, digits = 4): string {
  const figures = grouped(rounded(value / shown[unit].size, digits));
  if (unit === '') return figures;
  return unit === '°' ? `${figures}°` : `${figures}\u202f${unit}`;
}

/** The unit in which a value of this dimension reads best: 4.7 nF rather than 4700 pF. */
export function unitFor(value: number, among: readonly ShownUnit[]): ShownUnit {
  const size = Math.abs(value);
  const fitting = among.filter((unit) => size >= shown[unit].size * 0.9995);
  return fitting.at(-1) ?? among[0] ?? '';
}

export const capacitanceUnits: readonly ShownUnit[] = ['pF', 'nF'];
export const resistanceUnits: readonly ShownUnit[] = ['Ω', 'kΩ', 'MΩ'];

export const showCapacitance = (value: number) => showQuantity(value, value < 1e-8 ? 'pF' : 'nF');
export const showResistance = (value: number) => showQuantity(value, unitFor(value, resistanceUnits));

/** Frequencies stand ungrouped, whole kilohertz. */
export const showKHz = (value: number) => `${Math.round(value / 1000)}\u202fkHz`;

/** The edge of a band as the plan of bands gives it, to a tenth: 526.5 kHz. */
export const showEdge = (value: number) => `${Math.round(value / 100) / 10}\u202fkHz`;

/** "20 000" with thin no-break blanks from five digits on; minus is U+2212. */
export function grouped(figures: string | number): string {
  const text = String(figures);
  const [whole = '', decimals] = text.replace('-', '').split('.');
  const parts = whole.length >= 5 ? whole.replace(/\B(?=(\d{3})+$)/g, '\u202f') : whole;
  return `${text.startsWith('-') ? '\u2212' : ''}${parts}${decimals === undefined ? '' : `.${decimals}`}`;
}

const rounded = (value: number, digits: number) => String(Number(value.toPrecision(digits)));

/** Takes away the last bits that a change of unit brings in: 365 x 1e-12 is meant as 3.65e-10. */
const clean = (value: number) => Number(value.toPrecision(12));
