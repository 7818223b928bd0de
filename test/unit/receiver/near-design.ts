import fc from 'fast-check';
import type { DesignInput } from '@/services/receiver';

const linear = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const tolerance = linear(0, 0.12);
const dist = fc.constantFrom('uniform' as const, 'normal' as const);

/** A set for medium wave that just about works, its parts with tolerances, two strong stations near by. */
export const nearDesign: fc.Arbitrary<DesignInput> = fc
  .record({
    turns: fc.integer({ min: 62, max: 82 }),
    former: linear(0.045, 0.055),
    coupling: linear(8e-12, 40e-12),
    max: linear(380e-12, 560e-12),
    min: linear(8e-12, 22e-12),
    coilTol: tolerance,
    maxTol: tolerance,
    minTol: tolerance,
    dist,
    formerLength: linear(0.03, 0.07),
    q: linear(30, 200),
    second: linear(750e3, 900e3),
    slider: fc.boolean(),
    primaryTurns: fc.option(fc.integer({ min: 6, max: 40 }), { nil: undefined }),
  })
  .map((made) => {
    const spread = (nominal: number, tol: number) => ({ nominal, tol, dist: made.dist });
    const wire = { bare: 0.0005, overall: 0.000534 };
    const capacitor = {
      kind: 'capacitor' as const,
      min: spread(made.min, made.minTol),
      max: spread(made.max, made.maxTol),
      law: 'wavelength' as const,
    };
    return {
      format: 'coilyard-design/1',
      band: { lo: 526500, hi: 1606500, firstCarrier: 531000, lastCarrier: 1602000, step: 9000 },
      aerial: { kind: 'wire', vertical: 6, horizontal: 12, radius: 0.0005 },
      coupling: made.slider
        ? { kind: 'direct' }
        : made.primaryTurns === undefined
          ? { kind: 'series-c', c: made.coupling }
          : { kind: 'primary', turns: made.primaryTurns, diameter: made.former + 0.0005, gap: 0.003, wire },
      coil: {
        kind: 'solenoid',
        turns: made.slider ? 130 : made.turns,
        formerDiameter: spread(made.slider ? 0.07 : made.former, made.coilTol / 3),
        wire,
        pitch: 0.00055,
        q: made.q,
        ...(made.slider ? {} : { formerLength: made.formerLength }),
      },
      tuning: made.slider
        ? {
            kind: 'slider',
            minTurns: 20,
            maxTurns: made.turns + 45,
            c: { kind: 'capacitor', min: made.min, max: made.min * (1 + made.coilTol), law: 'capacitance' },
          }
        : capacitor,
      detector: { class: 'germanium', measured: true },
      earphone: { kind: 'magnetic', rDc: 4000, r: 18000, x: 16000 },
      place: {
        field: 0.02,
        stations: [
          { name: 'Sluice', f: 810000, field: 0.02 },
          { name: 'Weir', f: made.second, field: 0.06 },
        ],
      },
    };
  });
