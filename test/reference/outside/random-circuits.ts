import type { DesignInput } from '@/services/receiver';
import type { Chance } from './chance';

export const COUPLINGS = ['direct', 'series-c', 'aerial-tap', 'primary'] as const;
export const PLACES = ['top', 'tap'] as const;
export const TUNINGS = ['capacitor', 'padder-trimmer', 'foil'] as const;

export interface Form {
  coupling: (typeof COUPLINGS)[number];
  detectorAt: (typeof PLACES)[number];
  tuning: (typeof TUNINGS)[number];
}

const BANDS = [
  { lo: 526500, hi: 1606500, firstCarrier: 531000, lastCarrier: 1602000, step: 9000 },
  { lo: 525000, hi: 1705000, firstCarrier: 530000, lastCarrier: 1700000, step: 10000 },
  { lo: 148500, hi: 283500, firstCarrier: 153000, lastCarrier: 279000, step: 9000 },
  { lo: 5900000, hi: 6200000, firstCarrier: 5900000, lastCarrier: 6200000, step: 5000 },
];

/** Inductances of one to three sections with one coupling between all, scaled to a whole. */
function sectionsOf(chance: Chance, whole: number, count: number): number[][] {
  const own = Array.from({ length: count }, () => chance.log(0.3, 3));
  const k = chance.linear(0.05, 0.8);
  const rows = own.map((a, i) => own.map((b, j) => (i === j ? a : k * Math.sqrt(a * b))));
  const total = rows.flat().reduce((sum, l) => sum + l, 0);
  return rows.map((row) => row.map((l) => (whole * l) / total));
}

function measured(chance: Chance, whole: number, taps: number): DesignInput['coil'] {
  const loss = chance.coin() ? { q: chance.log(40, 400) } : { r: chance.log(2, 20) };
  const shape = { kind: 'measured' as const, cSelf: chance.linear(0, 10e-12), ...loss };
  if (taps === 0) return { ...shape, l: whole };
  const sections = sectionsOf(chance, whole, taps + 1);
  // The taps lie in either order; with three sections both are in use at different places.
  const [aerial, detector] = taps === 1 ? [1, 1] : chance.coin() ? [1, 2] : [2, 1];
  return { ...shape, sections, taps: { aerial, detector } };
}

/** A solenoid of about the wanted inductance (its exact sections are checked against sums of loops elsewhere). */
function solenoid(chance: Chance, whole: number, taps: number): DesignInput['coil'] {
  const formerDiameter = chance.linear(0.04, 0.08);
  const turns = Math.max(6, Math.round(Math.sqrt(whole / (0.6e-6 * formerDiameter))));
  const shape = {
    kind: 'solenoid' as const,
    turns,
    formerDiameter,
    wire: { bare: 0.0004, overall: 0.00043 },
    pitch: 0.0005,
    q: chance.log(60, 300),
  };
  if (taps === 0) return shape;
  const a = chance.whole(1, turns - 2);
  return { ...shape, taps: { aerial: a, detector: taps === 1 ? a : chance.whole(a + 1, turns - 1) } };
}

function aerialOf(chance: Chance, hi: number): DesignInput['aerial'] {
  if (chance.coin()) {
    const [r, l, c] = [chance.linear(0, 30), chance.log(1e-6, 4e-5), chance.log(5e-11, 4e-10)];
    return { kind: 'circuit', r, l, c, effectiveHeight: chance.linear(1, 12) };
  }
  // Up to 1.6 of the 2.2 radians that the line form holds for.
  const longest = (1.6 * 299792458) / (2 * Math.PI * hi);
  const vertical = chance.linear(0.1, 0.3) * Math.min(40, longest);
  const horizontal = chance.coin() ? 0 : chance.linear(0.2, 0.7) * Math.min(40, longest);
  return {
    kind: 'wire',
    vertical,
    horizontal,
    radius: chance.log(2e-4, 2e-3),
    siteFactor: chance.linear(0.9, 1.3),
  };
}

function tuningOf(chance: Chance, form: Form): Partial<DesignInput> & Pick<DesignInput, 'tuning'> {
  const min = chance.linear(6e-12, 20e-12);
  const max = chance.linear(250e-12, 550e-12);
  if (form.tuning === 'capacitor') return { tuning: { kind: 'capacitor', min, max, law: 'capacitance' } };
  if (form.tuning === 'padder-trimmer') {
    const [padder, trimmer] = [chance.log(4e-10, 4e-9), chance.linear(2e-12, 20e-12)];
    return { tuning: { kind: 'capacitor', min, max, law: 'frequency' }, padder, trimmer };
  }
  const [e, t] = [chance.linear(1.5, 4), chance.linear(0.1e-3, 0.3e-3)];
  const layers: [number, number][] = [
    [t, e],
    [chance.linear(0.02e-3, 0.1e-3), 1],
  ];
  const foil = { kind: 'foil' as const, layers, min, tan: chance.linear(0.001, 0.04) };
  if (chance.coin()) {
    const side = chance.linear(0.05, 0.09);
    return { tuning: { ...foil, form: 'plates', width: side, travel: side, faces: chance.whole(1, 3) } };
  }
  const [innerRadius, travel] = [chance.linear(0.01, 0.02), chance.linear(0.05, 0.12)];
  return { tuning: { ...foil, form: 'sleeve', innerRadius, travel } };
}

/** A random receiver of one form. Values of the trade's usual magnitudes, all exact. */
export function randomCircuit(chance: Chance, form: Form): DesignInput {
  const band = chance.of(BANDS);
  const w = 2 * Math.PI * band.lo;
  // The aerial adds to the capacitance most where it meets the top of the coil directly.
  const whole =
    1 / (w * w * (form.coupling === 'direct' ? chance.linear(550e-12, 900e-12) : chance.linear(350e-12, 550e-12)));
  const used = [form.coupling === 'aerial-tap', form.detectorAt === 'tap'].filter(Boolean).length;
  const taps = used === 2 ? chance.whole(1, 2) : used;
  const coil = chance.linear(0, 1) < 0.3 ? solenoid(chance, whole, taps) : measured(chance, whole, taps);
  const couplings: Record<Form['coupling'], DesignInput['coupling']> = {
    direct: { kind: 'direct' },
    'series-c': { kind: 'series-c', c: chance.log(5e-12, 8e-11) },
    'aerial-tap': { kind: 'aerial-tap' },
    primary: {
      kind: 'primary',
      l: whole * chance.log(0.02, 0.3),
      r: chance.linear(0.2, 5),
      k: chance.linear(0.05, 0.6),
    },
  };
  return {
    format: 'coilyard-design/1',
    band,
    aerial: aerialOf(chance, band.hi),
    earth: chance.linear(0, 1) < 0.2 ? { kind: 'none' } : { kind: 'resistance', r: chance.linear(5, 200) },
    coupling: couplings[form.coupling],
    detectorAt: form.detectorAt,
    coil,
    ...tuningOf(chance, form),
    stray: chance.linear(1e-12, 10e-12),
    detector: {
      class: chance.of(['germanium', 'zero-bias-schottky', 'schottky', 'silicon', 'mineral', 'oxide-contact']),
    },
    earphone: { kind: 'magnetic', rDc: chance.log(1e3, 1e4), r: 18000, x: 16000 },
  };
}
