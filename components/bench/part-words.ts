import type { PartValue, PartValues } from '@/services/parts/schemas';
import {
  capacitanceUnits,
  figuresIn,
  resistanceUnits,
  showQuantity,
  type ShownUnit,
  unitFor,
} from '@/services/quantity';

/** What a part's line says: a figure with its unit, its tolerance in percent, and its make-up. */
export interface PartWords {
  value?: string;
  unit?: string;
  tolerance: number | null;
  detail: string;
}

export function partWords(values: PartValues): PartWords {
  switch (values.kind) {
    case 'coil-former':
      return {
        ...figure(values.outerDiameter, ['mm']),
        detail: `${showQuantity(values.length, 'mm')} long, ${wallWords[values.wall]}`,
      };
    case 'wire':
      return {
        value: figuresIn(values.bare, 'mm'),
        unit: 'mm',
        tolerance: null,
        detail: `${values.covering}, ${showQuantity(values.overall, 'mm')} over all`,
      };
    case 'variable-capacitor': {
      const { min, max, law, turnDegrees } = values;
      return {
        value: `${figuresIn(min.nominal, 'pF')}–${figuresIn(max.nominal, 'pF')}`,
        unit: 'pF',
        tolerance: percentOf(max.tol),
        detail: `${lawWords[law]}, turns ${turnDegrees}°`,
      };
    }
    case 'foil-capacitor':
      return {
        ...figure(values.sheetThickness, ['μm', 'mm']),
        detail: `${showQuantity(values.width, 'mm')} wide, slides ${showQuantity(values.travel, 'mm')}, ${values.faces} faces`,
      };
    case 'fixed-capacitor':
      return { ...figure(values.c, capacitanceUnits), detail: 'fixed' };
    case 'resistor':
      return { ...figure(values.r, resistanceUnits), detail: 'fixed' };
    case 'detector':
      return {
        ...(values.forwardVoltageAt1mA ? figure(values.forwardVoltageAt1mA, ['V']) : { tolerance: null }),
        detail: `${classWords[values.detectorClass]}, ${values.measured ? 'measured' : 'not measured'}`,
      };
    case 'earphone':
      return values.earphoneKind === 'ceramic'
        ? { ...figure(values.c, capacitanceUnits), detail: 'crystal, needs a path for direct current' }
        : {
            ...figure(values.r, resistanceUnits),
            detail: `${phoneWords[values.earphoneKind]}, ${showQuantity(values.rDc.nominal, 'Ω')} direct`,
          };
    case 'transformer':
      return {
        value: `${values.ratio}:1`,
        tolerance: null,
        detail: `${showQuantity(values.primaryR.nominal, 'Ω')} primary`,
      };
    case 'aerial-wire':
      return {
        value: figuresIn(values.length, 'm'),
        unit: 'm',
        tolerance: null,
        detail: `${showQuantity(values.radius * 2, 'mm')} thick`,
      };
    case 'earth-lead':
      return { value: figuresIn(values.length, 'm'), unit: 'm', tolerance: null, detail: 'clip and lead' };
    case 'hardware':
    case 'tool':
    case 'print':
    case 'packaging':
      return { tolerance: null, detail: '' };
  }
}

export const wallWords = { air: 'open', thin: 'thin wall', solid: 'solid wall', damp: 'untreated card' } as const;
export const lawWords = {
  capacitance: 'even capacitance',
  wavelength: 'even wavelength',
  frequency: 'even frequency',
} as const;
export const classWords = {
  germanium: 'germanium',
  'zero-bias-schottky': 'zero-bias Schottky',
  schottky: 'Schottky',
  silicon: 'silicon',
  mineral: 'mineral',
  'oxide-contact': 'oxide contact',
} as const;
export const drawingWords = {
  terminal: 'terminal',
  board: 'board',
  knob: 'knob',
  screw: 'screw',
  packet: 'packet of small pieces',
} as const;
export const phoneWords = {
  magnetic: 'magnetic',
  armature: 'balanced armature',
  dynamic: 'dynamic',
  ceramic: 'crystal',
} as const;

function figure(value: PartValue, units: readonly ShownUnit[]): Pick<PartWords, 'value' | 'unit' | 'tolerance'> {
  const unit = unitFor(value.nominal, units);
  return { value: figuresIn(value.nominal, unit), unit, tolerance: percentOf(value.tol) };
}

const percentOf = (tol: number | undefined) => (tol === undefined ? null : Number((tol * 100).toPrecision(3)));
