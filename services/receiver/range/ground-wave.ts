import { within } from '../invalid-input';
import { exp, log } from '../numeric/exp-log';
import { PI, atan, cos, sin } from '../numeric/trig';
import { EPSILON_0, LIGHT_SPEED, TWO_PI, type Hertz, type Metre, type Watt } from '../units';

export interface Ground {
  /** Siemens a metre. */
  sigma: number;
  epsilonR: number;
}

/** Field of a short vertical over perfect ground, rms V/m: 0.3 V/m at 1 km for 1 kW (reference of ITU-R P.368). */
export function perfectGroundField(power: Watt, distance: Metre): number {
  return (0.3 * Math.sqrt(power / 1000) * 1000) / distance;
}

function conductionRatio({ sigma }: Ground, f: Hertz): number {
  return sigma / (TWO_PI * f * EPSILON_0);
}

/** Phase constant b of Norton. */
export function phaseConstant(ground: Ground, f: Hertz): number {
  return atan((ground.epsilonR + 1) / conductionRatio(ground, f));
}

/** Norton's numerical distance p. */
export function numericalDistance(ground: Ground, f: Hertz, distance: Metre): number {
  const wavelength = LIGHT_SPEED / f;
  return (PI * distance * cos(phaseConstant(ground, f))) / (wavelength * conductionRatio(ground, f));
}

/** Attenuation by Norton and van der Pol: a quick check, -3.9 dB off where b is near 1. */
export function vanDerPol(ground: Ground, f: Hertz, distance: Metre): number {
  const p = numericalDistance(ground, f, distance);
  return (2 + 0.3 * p) / (2 + p + 0.6 * p * p) - Math.sqrt(p / 2) * exp(-0.6 * p) * sin(phaseConstant(ground, f));
}

interface Complex {
  re: number;
  im: number;
}

const times = (a: Complex, b: Complex): Complex => ({ re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re });
const over = (a: Complex, b: Complex): Complex => {
  const size = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / size, im: (a.im * b.re - a.re * b.im) / size };
};

function root({ re, im }: Complex): Complex {
  const size = Math.sqrt(re * re + im * im);
  const real = Math.sqrt(Math.max(0, (size + re) / 2));
  const imaginary = Math.sqrt(Math.max(0, (size - re) / 2));
  return { re: real, im: im < 0 ? -imaginary : imaginary };
}

/**
 * Attenuation over flat ground after Sommerfeld, |F|. Against the Faddeeva function 5e-4; against NTIA's LFMF, inside the
 * flat-earth limit, 0 to +1.3 dB.
 * @see receiver.md G1
 */
export function sommerfeld(ground: Ground, f: Hertz, distance: Metre): number {
  const eta: Complex = { re: ground.epsilonR, im: -conductionRatio(ground, f) };
  const d = over(root({ re: eta.re - 1, im: eta.im }), eta);
  const half = (TWO_PI * f * distance) / (2 * LIGHT_SPEED);
  const q = times({ re: 0, im: -half }, times(d, d));
  const size = Math.sqrt(q.re * q.re + q.im * q.im);
  const sum = size < 12 ? nearField(q) : farField(q);
  return Math.sqrt(sum.re * sum.re + sum.im * sum.im);
}

/** Sum of t_m less j sqrt(pi q) e^-q. */
function nearField(q: Complex): Complex {
  let term: Complex = { re: 1, im: 0 };
  let sum = term;
  for (let m = 1; m < 200; m += 1) {
    const factor = -2 / (2 * m - 1);
    term = times(term, { re: q.re * factor, im: q.im * factor });
    sum = { re: sum.re + term.re, im: sum.im + term.im };
    if (Math.abs(term.re) + Math.abs(term.im) < 1e-18) break;
  }
  const wave = times(root({ re: PI * q.re, im: PI * q.im }), {
    re: exp(-q.re) * cos(q.im),
    im: -exp(-q.re) * sin(q.im),
  });
  return { re: sum.re + wave.im, im: sum.im - wave.re };
}

/** Asymptotic series, stopped at its smallest term. */
function farField(q: Complex): Complex {
  let term: Complex = { re: 1, im: 0 };
  let sum: Complex = { re: 0, im: 0 };
  let least = Infinity;
  for (let m = 1; m < 60; m += 1) {
    term = over({ re: term.re * (2 * m - 1), im: term.im * (2 * m - 1) }, { re: 2 * q.re, im: 2 * q.im });
    const size = Math.abs(term.re) + Math.abs(term.im);
    if (size > least) break;
    least = size;
    sum = { re: sum.re - term.re, im: sum.im - term.im };
  }
  return sum;
}

/** Distance up to which the earth counts as flat (ITU handbook on ground-wave propagation). */
export function flatEarthLimit(f: Hertz): Metre {
  return 80000 / exp(log(f / 1e6) / 3);
}

/**
 * Factor for the curvature of the earth: our own fit to LFMF, pessimistic on purpose; no estimate beyond three limits.
 * @see receiver.md G1
 */
export function curvature(f: Hertz, distance: Metre): number {
  const ratio = distance / flatEarthLimit(f);
  return exp(((-1.3 * exp(1.6 * log(ratio))) / 20) * 2.302585092994046);
}

/**
 * Field of a station by day, rms V/m, or null beyond three flat-earth limits. Range: 0.2 to 1.6 MHz, six grounds. Error
 * against NTIA's LFMF: -0.8 to 0 dB inside the flat-earth limit, -5 to 0 dB to three of them; hills and towns +-10 dB.
 * @see receiver.md G1
 */
export function stationField(power: Watt, ground: Ground, f: Hertz, distance: Metre): number | null {
  within('distance', distance, 1, 2e7);
  if (distance > 3 * flatEarthLimit(f)) return null;
  return perfectGroundField(power, distance) * sommerfeld(ground, f, distance) * curvature(f, distance);
}
