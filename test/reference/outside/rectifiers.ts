import type { Chance } from './chance';
import { runOn } from './programs';

/** A detector that fills a capacitor beside its load, fed by an ideal source or by a tuned circuit with a resistance. */
export interface Rectifier {
  is: number;
  n: number;
  load: number;
  /** Radio voltage, peak: open where a source resistance is given. */
  volts: number;
  /** Null for an ideal source. */
  source: number | null;
}

/** Radio frequency of all of them, hertz; temperature of the simulator, kelvin. */
const RADIO = 1e6;
export const SIMULATED_KELVIN = 300.15;
/** Time constant of load and capacitor; how long and how finely they are watched, seconds. */
const SETTLES = 150e-6;
const IDEAL = { watched: 900e-6, step: 15e-9 };
/** A tuned circuit yields, which slows the settling, and a coarse step would turn its frequency. */
const TUNED = { watched: 2.4e-3, step: 5e-9 };
/** Q of the tuned circuit that shorts the harmonics of the current, loaded. */
const SHORTING_Q = 60;

export function randomRectifier(chance: Chance, behind: boolean): Rectifier {
  return {
    is: chance.log(3e-9, 8e-6),
    n: chance.linear(1.02, 2.2),
    load: chance.log(5e3, 1e6),
    volts: chance.log(0.03, 1),
    source: behind ? chance.log(2e4, 2e5) : null,
  };
}

/** Where the simulation begins: off the expected direct voltage, so that it has to settle. */
export interface Expected {
  start: number;
  /** About the radio resistance of the detector, by which the tuned circuit is made. */
  input: number;
}

export interface Settled {
  vdc: number;
  /** Fundamental of the current drawn from an ideal source, peak. */
  i1: number;
}

/** Elements of one rectifier. */
function elements({ is, n, load, volts, source }: Rectifier, i: number, { start, input }: Expected): string[] {
  const zero = (n * 8.617333262e-5 * SIMULATED_KELVIN) / is;
  const smoothing = (SETTLES * (load + zero)) / (load * zero);
  const lines = [
    `.model d${i} d(is=${is} n=${n} rs=0 cjo=0 tt=0)`,
    `d${i} a${i} b${i} d${i}`,
    `r${i} b${i} 0 ${load}`,
    `c${i} b${i} 0 ${smoothing} ic=${start}`,
  ];
  const wave = (peak: number): string => `sin(0 ${peak} ${RADIO} 0 0 90)`;
  if (source === null) return [...lines, `v${i} a${i} 0 ${wave(volts)}`];
  const w = 2 * Math.PI * RADIO;
  const c = (SHORTING_Q * (source + input)) / (w * source * input);
  const tank = [`rt${i} a${i} 0 ${source}`, `ct${i} a${i} 0 ${c} ic=0`, `lt${i} a${i} 0 ${1 / (w * w * c)} ic=0`];
  return [...lines, ...tank, `it${i} 0 a${i} ${wave(volts / source)}`];
}

/** One run; the direct voltages are means of the last twenty cycles. */
function simulated(
  rectifiers: readonly Rectifier[],
  expected: readonly Expected[],
  { watched, step }: typeof IDEAL,
): Settled[] {
  const span = `from=${watched - 20 / RADIO} to=${watched}`;
  const meas = rectifiers.flatMap(({ source }, i) => [
    `meas tran vdc${i} avg v(b${i}) ${span}`,
    ...(source === null
      ? [`let p${i} = -2*i(v${i})*cos(2*pi*${RADIO}*time)`, `meas tran i1x${i} avg p${i} ${span}`]
      : []),
  ]);
  const deck = [
    '* rectifiers',
    '.options gmin=1e-16 reltol=1e-5 abstol=1e-15 vntol=1e-9',
    ...rectifiers.flatMap((one, i) => elements(one, i, expected[i] ?? { start: 0, input: 1e5 })),
    '.control',
    'set numdgt=10',
    `tran ${step} ${watched} ${watched - 25 / RADIO} ${step} uic`,
    ...meas,
    'quit',
    '.endc',
    '.end',
    '',
  ];
  return runOn('ngspice', ['-b', 'all.cir'], { 'all.cir': deck.join('\n') }, ({ output }) => {
    const found = new Map<string, number>();
    for (const [, name = '', value] of output.matchAll(/^(\w+)\s*=\s*(\S+)/gm)) found.set(name, Number(value));
    return rectifiers.map((_, i) => ({ vdc: found.get(`vdc${i}`) ?? NaN, i1: found.get(`i1x${i}`) ?? NaN }));
  });
}

/** Simulates rectifiers of one kind. */
export function settled(rectifiers: readonly Rectifier[], expected: readonly Expected[]): Settled[] {
  const tuned = rectifiers.some(({ source }) => source !== null);
  return simulated(rectifiers, expected, tuned ? TUNED : IDEAL);
}
