import type { FrozenLine } from '../kits/schemas';
import { amountText } from '../packing/rules';
import { type PartValues, silhouetteOf } from '../parts/schemas';
import { showCapacitance, showResistance } from '../quantity';
import { capacitorCode, resistorBands } from './markings';
import { printable } from './rules';
import type { GuidePart } from './schemas';

/** How to recognise a part that carries a code, so that a 10 pF marked 100 is not taken for 100 pF. */
export function markingOf(values: PartValues): string {
  if (values.kind === 'resistor') {
    const bands = resistorBands(values.r.nominal, values.r.tol);
    return bands ? `bands ${bands.join(', ')}` : '';
  }
  if (values.kind === 'fixed-capacitor') {
    const code = capacitorCode(values.c.nominal);
    return code === null ? '' : `marked ${code}`;
  }
  if (values.kind === 'detector') return 'band at one end';
  return '';
}

/** The value that stands beside a part in the circuit drawing. */
export function valueOf(values: PartValues): string {
  switch (values.kind) {
    case 'variable-capacitor':
      return `${figure(showCapacitance(values.min.nominal))} to ${printable(showCapacitance(values.max.nominal))}`;
    case 'foil-capacitor':
      return 'foil plates';
    case 'fixed-capacitor':
      return printable(showCapacitance(values.c.nominal));
    case 'resistor':
      return printable(showResistance(values.r.nominal));
    case 'earphone':
      return values.earphoneKind === 'ceramic' ? 'crystal' : printable(showResistance(values.rDc.nominal));
    case 'detector':
      return values.detectorClass.replaceAll('-', ' ');
    case 'transformer':
      return `${values.ratio} to 1`;
    default:
      return '';
  }
}

/** The number without its unit, where the unit follows once for a range. */
const figure = (text: string) => printable(text).split(/[\u00a0\u202f]/)[0] ?? text;

export function guidePart(line: FrozenLine): GuidePart | null {
  if (!line.part) return null;
  const { part } = line;
  const isCut = part.unit !== 'each';
  return {
    reference: line.reference,
    name: printable(part.name),
    family: silhouetteOf(part.values),
    amount: printable(isCut ? amountText(line.quantity, part.unit) : String(line.quantity)),
    marking: markingOf(part.values),
    note: printable(line.note),
  };
}
