import fc from 'fast-check';
import type { DesignInput } from '@/services/receiver';

/** Number on a logarithmic scale, so that small and large values come up alike. */
function log(min: number, max: number): fc.Arbitrary<number> {
  return fc
    .double({ min: Math.log(min), max: Math.log(max), noNaN: true })
    .map((x) => Math.min(max, Math.max(min, Math.exp(x))));
}

function linear(min: number, max: number): fc.Arbitrary<number> {
  return fc.double({ min, max, noNaN: true });
}

type Spread = {
  nominal: number;
  tol: number;
  dist: 'uniform' | 'normal' | 'binned' | 'log-uniform';
  bin?: number;
  lot?: { n: number; mean: number; s: number };
};

/** A value with or without a spread; a fifth of the spreads were measured. */
function value(number: fc.Arbitrary<number>): fc.Arbitrary<number | Spread> {
  const spread = fc
    .record({
      nominal: number,
      tol: linear(0, 0.2),
      dist: fc.constantFrom('uniform', 'normal', 'binned', 'log-uniform'),
      lot: fc.integer({ min: 0, max: 20 }),
    })
    .map(({ nominal, tol, dist, lot }): Spread => {
      const made: Spread = { nominal, tol, dist };
      if (dist === 'binned') made.bin = tol / 2;
      if (lot > 16) made.lot = { n: lot - 14, mean: nominal, s: Math.abs(nominal) * 0.01 + 1e-30 };
      return made;
    });
  return fc.oneof({ weight: 3, arbitrary: number }, { weight: 1, arbitrary: spread });
}

const BANDS = [
  { lo: 526500, hi: 1606500, firstCarrier: 531000, lastCarrier: 1602000, step: 9000 },
  { lo: 525000, hi: 1705000, firstCarrier: 530000, lastCarrier: 1700000, step: 10000 },
  { lo: 148500, hi: 283500, firstCarrier: 153000, lastCarrier: 279000, step: 9000 },
  { lo: 5900000, hi: 6200000, firstCarrier: 5900000, lastCarrier: 6200000, step: 5000 },
];

const aerial = fc.oneof(
  fc.record({
    kind: fc.constant('circuit' as const),
    r: value(linear(0, 30)),
    l: value(log(1e-7, 1e-4)),
    c: value(log(1e-11, 1e-9)),
    effectiveHeight: value(log(0.1, 20)),
  }),
  fc.record({
    kind: fc.constant('wire' as const),
    vertical: value(linear(2, 6)),
    horizontal: fc.oneof(fc.constant(0 as const), value(linear(2, 8))),
    radius: value(log(2e-4, 2e-3)),
    siteFactor: value(linear(0.9, 1.3)),
  }),
);

const earth = fc.oneof(
  fc.record({ kind: fc.constant('resistance' as const), r: value(linear(0, 300)) }),
  fc.constant({ kind: 'none' as const }),
);

const capacitor = fc
  .record({
    min: log(3e-12, 3e-11),
    span: log(1.5, 60),
    law: fc.constantFrom('capacitance', 'wavelength', 'frequency'),
  })
  .map(({ min, span, law }) => ({ kind: 'capacitor' as const, min, max: Math.min(1e-8, min * span), law }));

const foil = fc
  .record({
    side: linear(0.02, 0.1),
    thickness: log(5e-5, 1e-3),
    er: linear(1, 6),
    faces: fc.integer({ min: 1, max: 3 }),
    tan: linear(0, 0.06),
  })
  .map(({ side, thickness, er, faces, tan }) => ({
    kind: 'foil' as const,
    form: 'plates' as const,
    width: side,
    travel: side,
    layers: [[thickness, er] as [number, number]],
    faces,
    tan,
  }));

const wire = fc.constantFrom<{ bare: number; overall?: number; strands?: number }>(
  { bare: 0.0005, overall: 0.000534 },
  { bare: 0.000315 },
  { bare: 0.00004, overall: 0.00065, strands: 165 },
);

interface CoilParts {
  coil: DesignInput['coil'];
  /** Turns or sections a tap may lie below; 1 for none. */
  taps: number;
  step: number;
}

const measured: fc.Arbitrary<CoilParts> = fc.oneof(
  fc.record({ l: value(log(2e-6, 3e-3)), q: value(linear(20, 400)), cSelf: value(linear(0, 2e-11)) }).map((coil) => ({
    coil: { kind: 'measured' as const, ...coil },
    taps: 1,
    step: 1,
  })),
  fc
    .record({ l1: log(5e-6, 1e-4), ratio: linear(1, 6), k: linear(0.05, 0.8), r: linear(1, 20) })
    .map(({ l1, ratio, k, r }) => ({
      coil: {
        kind: 'measured' as const,
        sections: [
          [l1, k * l1 * Math.sqrt(ratio)],
          [k * l1 * Math.sqrt(ratio), l1 * ratio],
        ],
        r,
        cSelf: 5e-12,
      },
      taps: 2,
      step: 1,
    })),
);

const solenoid: fc.Arbitrary<CoilParts> = fc
  .record({
    turns: fc.integer({ min: 10, max: 150 }),
    formerDiameter: value(linear(0.03, 0.09)),
    wire,
    q: fc.option(value(linear(30, 300)), { nil: undefined }),
  })
  .map(({ q, ...coil }) => ({
    coil: { kind: 'solenoid' as const, ...coil, ...(q === undefined ? {} : { q }) },
    taps: coil.turns,
    step: 1,
  }));

const spiral: fc.Arbitrary<CoilParts> = fc
  .record({
    turns: fc.integer({ min: 10, max: 50 }),
    innerDiameter: value(linear(0.02, 0.06)),
    pitch: linear(0.0009, 0.0015),
    offset: linear(0, 0.001),
  })
  .map((coil) => ({
    coil: { kind: 'spiral' as const, ...coil, wire: { bare: 0.0005, overall: 0.000534 } },
    taps: coil.turns,
    step: 1,
  }));

const multilayer: fc.Arbitrary<CoilParts> = fc
  .record({
    layers: fc.integer({ min: 2, max: 5 }),
    turnsPerLayer: fc.integer({ min: 5, max: 15 }),
    innerDiameter: value(linear(0.01, 0.03)),
  })
  .map(({ layers, turnsPerLayer, innerDiameter }) => ({
    coil: {
      kind: 'multilayer' as const,
      layers,
      turnsPerLayer,
      innerDiameter,
      length: turnsPerLayer * 6e-4,
      layerPitch: 6e-4,
      wire: { bare: 0.0005, overall: 0.000534 },
    },
    taps: layers * turnsPerLayer,
    step: turnsPerLayer,
  }));

const rod: fc.Arbitrary<CoilParts> = fc
  .record({ muInitial: value(linear(125, 400)), turns: fc.integer({ min: 30, max: 80 }), tanM: linear(0, 0.03) })
  .map((coil) => ({
    coil: {
      kind: 'rod' as const,
      ...coil,
      rodLength: 0.14,
      rodDiameter: 0.01,
      coilLength: 0.042,
      wire: { bare: 0.0005, overall: 0.000534 },
    },
    taps: 1,
    step: 1,
  }));

const detector: fc.Arbitrary<DesignInput['detector']> = fc.oneof(
  fc.record({
    class: fc.constantFrom('germanium', 'zero-bias-schottky', 'schottky', 'silicon', 'mineral', 'oxide-contact'),
    measured: fc.boolean(),
  }),
  fc.record({ is: log(1e-11, 1e-4), n: linear(1, 4), cj: linear(0, 2e-11) }),
  fc.record({ vf1mA: linear(0.1, 0.6), n: linear(1, 1.8) }),
);

const earphone: fc.Arbitrary<DesignInput['earphone']> = fc.oneof(
  fc.record({ kind: fc.constant('ceramic' as const), c: log(1e-10, 5e-8) }),
  fc.record({
    kind: fc.constantFrom('magnetic' as const, 'armature' as const, 'dynamic' as const),
    rDc: log(10, 8000),
    r: log(10, 50000),
    x: linear(-1000, 30000),
  }),
);

const extras = fc.record({
  returnResistor: fc.option(log(1e3, 1e7), { nil: undefined }),
  transformer: fc.option(fc.record({ ratio: linear(1, 100), primaryR: log(10, 5000) }), { nil: undefined }),
  padder: fc.option(value(log(1e-10, 1e-8)), { nil: undefined }),
  trimmer: fc.option(value(log(1e-12, 3e-11)), { nil: undefined }),
  bypass: fc.option(log(1e-11, 1e-8), { nil: undefined }),
  stray: value(linear(0, 2e-11)),
});

function withoutUndefined<T extends object>(object: T): Partial<{ [K in keyof T]: Exclude<T[K], undefined> }> {
  // Keys that are undefined are taken out, which is what the type says.
  return Object.fromEntries(Object.entries(object).filter(([, item]) => item !== undefined)) as Partial<{
    [K in keyof T]: Exclude<T[K], undefined>;
  }>;
}

/** Coupling and detector place that the coil can have. */
function circuitOf(
  { coil, taps, step }: CoilParts,
  pick: { coupling: number; tap: boolean; a: number; d: number; c: number | Spread; k: number },
) {
  const place = (share: number): number =>
    Math.max(step, Math.min(taps - step, Math.round((share * taps) / step) * step));
  const tapped = taps > step;
  const onTap = tapped && pick.tap;
  const couplings: DesignInput['coupling'][] = [
    { kind: 'direct' },
    { kind: 'series-c', c: pick.c },
    { kind: 'primary', l: 2e-5, r: 1, k: pick.k },
  ];
  if (tapped) couplings.push({ kind: 'aerial-tap' });
  const coupling = couplings[pick.coupling % couplings.length] ?? { kind: 'direct' };
  const made = tapped ? { ...coil, taps: { aerial: place(pick.a), detector: place(pick.d) } } : coil;
  return { coil: made, coupling, detectorAt: onTap ? ('tap' as const) : ('top' as const) };
}

const parts = fc.record({
  band: fc.constantFrom(...BANDS),
  aerial,
  earth,
  detector,
  earphone,
  extras,
});

const pick = fc.record({
  coupling: fc.integer({ min: 0, max: 11 }),
  tap: fc.boolean(),
  a: linear(0.1, 0.9),
  d: linear(0.1, 0.9),
  c: value(log(5e-12, 2e-10)),
  k: linear(0.05, 0.6),
});

const fixedCoil: fc.Arbitrary<DesignInput> = fc
  .tuple(parts, fc.oneof(measured, solenoid, spiral, multilayer, rod), pick, fc.oneof(capacitor, foil))
  .map(([{ extras: more, ...rest }, coilParts, picked, tuning]) => ({
    format: 'coilyard-design/1' as const,
    ...rest,
    ...circuitOf(coilParts, picked),
    tuning,
    ...withoutUndefined(more),
  }));

const slider: fc.Arbitrary<DesignInput> = fc
  .tuple(
    parts,
    fc.integer({ min: 40, max: 150 }),
    pick,
    fc.oneof<fc.Arbitrary<number | Spread>[]>(value(linear(0, 5e-11))),
    fc.option(capacitor, { nil: undefined }),
  )
  .map(([{ extras: more, ...rest }, turns, picked, c, gang]) => ({
    format: 'coilyard-design/1' as const,
    ...rest,
    coil: { kind: 'solenoid' as const, turns, formerDiameter: 0.07, wire: { bare: 0.0005, overall: 0.000534 } },
    coupling: picked.tap ? { kind: 'direct' as const } : { kind: 'series-c' as const, c: picked.c },
    tuning: { kind: 'slider' as const, minTurns: 10, maxTurns: turns, c: gang ?? c },
    ...withoutUndefined(more),
  }));

const variable: fc.Arbitrary<DesignInput> = fc
  .tuple(parts, value(log(2e-5, 2e-4)), pick, value(log(2e-11, 3e-10)))
  .map(([{ extras: more, ...rest }, min, picked, c]) => ({
    format: 'coilyard-design/1' as const,
    ...rest,
    coil: { kind: 'measured' as const, q: 120, cSelf: 5e-12 },
    coupling: { kind: 'series-c' as const, c: picked.c },
    tuning: {
      kind: 'inductance' as const,
      min,
      max: (typeof min === 'number' ? min : (min.lot?.mean ?? min.nominal)) * 6,
      c,
    },
    ...withoutUndefined(more),
  }));

/** A random design of any form; a few are not valid (a wire too long for short wave) and say so. */
export const anyDesign: fc.Arbitrary<DesignInput> = fc.oneof(
  { weight: 6, arbitrary: fixedCoil },
  { weight: 1, arbitrary: slider },
  { weight: 1, arbitrary: variable },
);
