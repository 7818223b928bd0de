import type { PartValues } from '../parts/schemas';

/** The drawing of a part's family by its kind; a pair of capsules on a band is drawn as a headset. */
function familyOf(values: PartValues): string {
  switch (values.kind) {
    case 'coil-former':
      return 'coil-tube';
    case 'wire':
      return 'reel';
    case 'variable-capacitor':
      return 'vanes';
    case 'foil-capacitor':
      return 'foil-plates';
    case 'fixed-capacitor':
      return 'fixed-capacitor';
    case 'earphone':
      return values.earphoneKind === 'ceramic' ? 'earpiece' : 'headset';
    case 'aerial-wire':
      return 'aerial';
    case 'earth-lead':
      return 'earth';
    case 'hardware':
      return 'terminal';
    case 'print':
      return 'guide';
    case 'packaging':
      return 'box';
    case 'resistor':
    case 'detector':
    case 'transformer':
    case 'tool':
      return values.kind;
  }
}

/** Hardware is one kind of many shapes; its name tells a board and a knob from a terminal. */
export function familyOfPart(part: { name: string; values: PartValues }): string {
  if (part.values.kind !== 'hardware') return familyOf(part.values);
  if (/\bboard\b|\bbase\b/i.test(part.name)) return 'board';
  if (/\bknob\b/i.test(part.name)) return 'knob';
  if (/\bterminal|\bpost|\bclip/i.test(part.name)) return 'terminal';
  return 'packet';
}
