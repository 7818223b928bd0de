import type { PartKind, PartValues } from '@/services/parts/schemas';
import type { ShownUnit } from '@/services/quantity';
import { classWords, drawingWords, lawWords, phoneWords, wallWords } from './part-words';

/** How a kind's values are asked for. The schema of the kind decides what may stand in each. */
export type PartField =
  /** With tolerance, distribution and where it comes from. */
  | { type: 'value'; key: string; label: string; unit: ShownUnit; hint?: string; optional?: true }
  | { type: 'number'; key: string; label: string; unit: ShownUnit; hint?: string; optional?: true }
  | { type: 'choice'; key: string; label: string; options: Readonly<Record<string, string>> }
  | { type: 'text'; key: string; label: string; hint?: string }
  | { type: 'flag'; key: string; label: string; hint?: string };

export function fieldsOf(values: PartValues): readonly PartField[] {
  if (values.kind === 'earphone') return earphoneFields(values.earphoneKind);
  return fields[values.kind];
}

const fields: Record<Exclude<PartKind, 'earphone'>, readonly PartField[]> = {
  'coil-former': [
    { type: 'value', key: 'outerDiameter', label: 'Outer diameter', unit: 'mm' },
    { type: 'number', key: 'length', label: 'Length', unit: 'mm' },
    { type: 'choice', key: 'wall', label: 'Wall', options: wallWords },
  ],
  wire: [
    { type: 'number', key: 'bare', label: 'Bare diameter', unit: 'mm', hint: 'Also "26 AWG" or "24 SWG".' },
    { type: 'number', key: 'overall', label: 'Over its covering', unit: 'mm' },
    { type: 'text', key: 'covering', label: 'Covering', hint: 'Enamel, cotton, silk.' },
  ],
  'variable-capacitor': [
    { type: 'value', key: 'min', label: 'Least capacitance', unit: 'pF' },
    { type: 'value', key: 'max', label: 'Largest capacitance', unit: 'pF' },
    { type: 'choice', key: 'law', label: 'Law', options: lawWords },
    { type: 'number', key: 'turnDegrees', label: 'Turn', unit: '°' },
  ],
  'foil-capacitor': [
    { type: 'number', key: 'width', label: 'Width of a plate', unit: 'mm' },
    { type: 'number', key: 'travel', label: 'Travel', unit: 'mm' },
    { type: 'value', key: 'sheetThickness', label: 'Thickness of the sheet', unit: 'μm' },
    { type: 'number', key: 'sheetPermittivity', label: 'Relative permittivity', unit: '' },
    { type: 'number', key: 'faces', label: 'Faces', unit: '' },
    { type: 'value', key: 'min', label: 'Least capacitance', unit: 'pF' },
  ],
  'fixed-capacitor': [{ type: 'value', key: 'c', label: 'Capacitance', unit: 'pF', hint: 'Also "4n7" or "100n".' }],
  resistor: [{ type: 'value', key: 'r', label: 'Resistance', unit: 'kΩ', hint: 'Also "4k7" or "1M".' }],
  detector: [
    { type: 'choice', key: 'detectorClass', label: 'Class', options: classWords },
    { type: 'value', key: 'saturationCurrent', label: 'Saturation current', unit: 'nA', optional: true },
    { type: 'value', key: 'idealityFactor', label: 'Ideality factor', unit: '', optional: true },
    { type: 'value', key: 'seriesResistance', label: 'Series resistance', unit: 'Ω', optional: true },
    { type: 'value', key: 'junctionCapacitance', label: 'Junction capacitance', unit: 'pF', optional: true },
    { type: 'value', key: 'forwardVoltageAt1mA', label: 'Forward voltage at 1 mA', unit: 'V', optional: true },
    { type: 'flag', key: 'measured', label: 'Its curve was measured', hint: 'Not taken from the class.' },
  ],
  transformer: [
    { type: 'number', key: 'ratio', label: 'Turns ratio, to one', unit: '' },
    { type: 'value', key: 'primaryR', label: 'Primary resistance', unit: 'Ω' },
    { type: 'number', key: 'lossDb', label: 'Loss, dB', unit: '' },
  ],
  'aerial-wire': [
    { type: 'number', key: 'length', label: 'Length', unit: 'm' },
    { type: 'number', key: 'radius', label: 'Radius', unit: 'mm', hint: 'Half its thickness.' },
  ],
  'earth-lead': [{ type: 'number', key: 'length', label: 'Length', unit: 'm' }],
  hardware: [{ type: 'choice', key: 'drawing', label: 'Drawn as', options: drawingWords }],
  tool: [],
  print: [],
  packaging: [],
};

function earphoneFields(kind: string): readonly PartField[] {
  const head: PartField = { type: 'choice', key: 'earphoneKind', label: 'Build', options: phoneWords };
  const threshold: PartField = {
    type: 'number',
    key: 'threshold',
    label: 'Least audible power',
    unit: 'pW',
    optional: true,
  };
  if (kind === 'ceramic') {
    return [
      head,
      { type: 'value', key: 'c', label: 'Capacitance', unit: 'nF' },
      { type: 'value', key: 'rDc', label: 'Leakage resistance', unit: 'MΩ' },
      threshold,
    ];
  }
  return [
    head,
    { type: 'value', key: 'rDc', label: 'Direct-current resistance', unit: 'Ω' },
    { type: 'value', key: 'r', label: 'Impedance at 1 kHz, resistive', unit: 'Ω', hint: 'The pair as connected.' },
    { type: 'number', key: 'x', label: 'Impedance at 1 kHz, reactive', unit: 'Ω' },
    threshold,
  ];
}

const estimate = (nominal: number) => ({ nominal, origin: 'maker' as const });

/** What a new part of a kind starts from: usual values, to be overwritten. */
export function firstValues(kind: PartKind): PartValues {
  switch (kind) {
    case 'coil-former':
      return { kind, outerDiameter: estimate(0.05), length: 0.1, wall: 'thin' };
    case 'wire':
      return { kind, bare: 0.0004, overall: 0.00043, covering: 'enamel' };
    case 'variable-capacitor':
      return { kind, min: estimate(1.2e-11), max: estimate(3.65e-10), law: 'capacitance', turnDegrees: 180 };
    case 'foil-capacitor':
      return {
        kind,
        width: 0.06,
        travel: 0.08,
        sheetThickness: estimate(0.0001),
        sheetPermittivity: 3,
        faces: 1,
        min: estimate(2e-11),
      };
    case 'fixed-capacitor':
      return { kind, c: estimate(4.7e-11) };
    case 'resistor':
      return { kind, r: estimate(47_000) };
    case 'detector':
      return { kind, detectorClass: 'germanium', measured: false };
    case 'earphone':
      return firstEarphone('magnetic');
    case 'transformer':
      return { kind, ratio: 10, primaryR: estimate(400), lossDb: 1 };
    case 'aerial-wire':
      return { kind, length: 20, radius: 0.0005 };
    case 'earth-lead':
      return { kind, length: 3 };
    case 'hardware':
      return { kind, drawing: 'terminal' };
    case 'tool':
    case 'print':
    case 'packaging':
      return { kind };
  }
}

export function firstEarphone(earphoneKind: 'ceramic' | 'magnetic' | 'armature' | 'dynamic'): PartValues {
  return earphoneKind === 'ceramic'
    ? { kind: 'earphone', earphoneKind, c: estimate(1.2e-8), rDc: estimate(2e7) }
    : { kind: 'earphone', earphoneKind, rDc: estimate(4000), r: estimate(18_000), x: 16_000 };
}
