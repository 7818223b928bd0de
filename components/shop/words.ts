import type { BoxItem, KitPage } from '@/services/catalogue/schemas';
import { showCapacitance, showResistance } from '@/services/quantity';
import { sayQuantity } from '@/services/stock/rules';

const numbers = [
  'No',
  'One',
  'Two',
  'Three',
  'Four',
  'Five',
  'Six',
  'Seven',
  'Eight',
  'Nine',
  'Ten',
  'Eleven',
  'Twelve',
];

/** "Four", up to twelve; figures from there. */
export const inWords = (count: number): string => numbers[count] ?? count.toString();

export const kHz = (hertz: number): string => Math.round(hertz / 1000).toString();

/** "Crystal earphone, 12 nF" or "Headset, 2 kΩ": what a buyer listens with. */
export function earphoneWords(box: readonly BoxItem[]): string {
  const phone = box.find((item) => item.values.kind === 'earphone');
  if (phone?.values.kind !== 'earphone') return 'Your own earphone';
  const { values } = phone;
  const figure =
    values.earphoneKind === 'ceramic' ? showCapacitance(values.c.nominal) : showResistance(values.r.nominal);
  return `${phone.name}, ${figure}`;
}

/** What the buyer still has to find: a place for the wire, and an earth. */
export function provideWords({ circuit, box }: Pick<KitPage, 'circuit' | 'box'>): string {
  const metres = Math.round(circuit.aerial.vertical + circuit.aerial.horizontal);
  const hasAerial = box.some((item) => item.values.kind === 'aerial-wire');
  const wire = hasAerial ? `A place for ${metres} m of wire, high and clear` : `${metres} m of wire, up high`;
  return circuit.earth.kind === 'none' ? wire : `${wire}, and a good earth`;
}

/** One line under a part's name: how many, and the value that matters. */
export function partDetail({ values, quantity, unit }: BoxItem): string {
  const many = unit !== 'each' || quantity > 1 ? sayQuantity(quantity, unit) : null;
  return [many, valueWords(values)].filter((words) => words !== null).join(', ');
}

function valueWords(values: BoxItem['values']): string | null {
  switch (values.kind) {
    case 'coil-former':
      return `${Math.round(values.outerDiameter.nominal * 1000)} mm across, ${Math.round(values.length * 1000)} mm long`;
    case 'wire':
      return `${(values.bare * 1000).toFixed(2).replace(/0$/, '')} mm, ${values.covering}`;
    case 'variable-capacitor':
      return `${Math.round(values.min.nominal * 1e12)} to ${showCapacitance(values.max.nominal)}`;
    case 'foil-capacitor':
      return `plates ${Math.round(values.width * 1000)} by ${Math.round(values.travel * 1000)} mm`;
    case 'fixed-capacitor':
      return showCapacitance(values.c.nominal);
    case 'resistor':
      return showResistance(values.r.nominal);
    case 'detector':
      return values.forwardVoltageAt1mA ? `${values.forwardVoltageAt1mA.nominal} V at 1 mA` : null;
    case 'earphone':
      return values.earphoneKind === 'ceramic' ? showCapacitance(values.c.nominal) : showResistance(values.r.nominal);
    case 'transformer':
      return `${values.ratio} to 1`;
    case 'aerial-wire':
    case 'earth-lead':
      return `${values.length} m`;
    default:
      return null;
  }
}
