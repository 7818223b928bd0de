import type { PartUnit } from '../parts/schemas';

/** What can still be promised: accepted stock that no buyer and no paid order has a claim on. */
export const availableFrom = (stock: { accepted: number; reserved: number; allocated: number }) =>
  stock.accepted - stock.reserved - stock.allocated;

export interface Buildable {
  count: number;
  /** The part that runs out first; null for a box that needs nothing. */
  limitedBy: string | null;
}

/** How many boxes the available parts make, if only this kit is built. A part without stock makes none. */
export function buildableFrom(needs: ReadonlyMap<string, number>, available: (code: string) => number): Buildable {
  let least: Buildable = { count: 0, limitedBy: null };
  for (const [code, need] of needs) {
    const count = Math.max(0, Math.floor(available(code) / need));
    if (least.limitedBy === null || count < least.count) least = { count, limitedBy: code };
  }
  return least;
}

/** Walking order of the store: aisle by aisle, place by place. "C-14" is 2014 + 1000 for its aisle's letter. */
export function walkingOrder(binCode: string): number {
  const [aisle = '', place = '0'] = binCode.split('-');
  let row = 0;
  for (const letter of aisle) row = row * 27 + (letter.charCodeAt(0) - 64);
  return row * 1000 + Number(place);
}

const grouped = (value: number) => value.toString().replace(/\B(?=(\d{3})+$)/g, '\u202f');
const group = (value: number) => (value >= 20_000 || value >= 10_000 ? grouped(value) : value.toString());

/** A stored quantity in the unit people count it in: "36", "13.8 m", "42 g". */
export function showQuantity(quantity: number, unit: PartUnit): { figure: string; unit: string } {
  if (unit === 'each') return { figure: group(quantity), unit: quantity === 1 ? 'piece' : 'pieces' };
  const whole = Math.trunc(quantity / 1000);
  const rest = Math.round(Math.abs(quantity % 1000) / 10);
  const figure = rest === 0 ? group(whole) : `${group(whole)}.${rest.toString().padStart(2, '0').replace(/0$/, '')}`;
  return { figure, unit: unit === 'metre' ? 'm' : 'g' };
}

export const sayQuantity = (quantity: number, unit: PartUnit) => {
  const shown = showQuantity(quantity, unit);
  return `${shown.figure} ${shown.unit}`;
};

interface Findable {
  code: string;
  name: string;
  lots: readonly { code: string; bins: readonly { code: string }[] }[];
}

/** Each word has to stand in the part's code or name, or begin the code of one of its lots or bins. */
export function isFound({ code, name, lots }: Findable, q: string): boolean {
  const said = `${code} ${name}`.toLowerCase();
  const codes = lots.flatMap((lot) => [lot.code, ...lot.bins.map((bin) => bin.code)]).map((one) => one.toLowerCase());
  return q
    .toLowerCase()
    .split(/\s+/)
    .every((word) => said.includes(word) || codes.some((one) => one.startsWith(word)));
}
