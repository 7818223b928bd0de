import { positive } from '../invalid-input';
import { asinh, log } from '../numeric/exp-log';
import { PI, sin, tan } from '../numeric/trig';
import { EPSILON_0, LIGHT_SPEED, TWO_PI, type Farad, type Henry, type Hertz, type Metre, type Ohm } from '../units';

/** Potential of a filament on itself (x the radius) or on a parallel equal one at distance x, over its length. */
function parallel(l: Metre, x: Metre): number {
  const ratio = x / l;
  return asinh(l / x) - Math.sqrt(1 + ratio * ratio) + ratio;
}

/** Two equal collinear filaments with a gap. */
function collinear(l: Metre, gap: Metre): number {
  const last = gap === 0 ? 0 : gap * log(gap);
  return (2 * l + gap) * log(2 * l + gap) - 2 * (l + gap) * log(l + gap) + last;
}

/** Two filaments at a right angle that meet at an end. */
function corner(l: Metre, u: Metre): number {
  return l * asinh(u / l) + u * asinh(l / u);
}

/**
 * Capacitance of a vertical wire whose foot is `foot` above ground (average potential, Howe's method). Through the
 * reactance within 1.7 % of nec2c up to 0.9 radian of wire. Insulation adds up to 5 %, house and trees 5 to 30 %.
 * @see receiver.md B1; test/reference/nec2c.test.ts
 */
export function verticalCapacitance(length: Metre, radius: Metre, foot: Metre): Farad {
  return (4 * PI * EPSILON_0 * length * length) / (2 * length * parallel(length, radius) - collinear(length, 2 * foot));
}

/** Capacitance of a horizontal wire at a height. */
export function horizontalCapacitance(length: Metre, radius: Metre, height: Metre): Farad {
  return (
    (4 * PI * EPSILON_0 * length * length) / (2 * length * (parallel(length, radius) - parallel(length, 2 * height)))
  );
}

/**
 * Capacitance of an inverted L: riser from the ground and top wire, each with its own even charge (two-section), or one
 * even charge on both (older, 0.1 to 0.2 % lower).
 * Range: risers of 3 to 12 m, top wires of 5 to 35 m, radii of 0.2 to 3 mm. Through the reactance within 1.7 % of nec2c up
 * to 0.9 radian of wire, 3.5 % at 1.3.
 * @see receiver.md B1, B3; test/reference/nec2c.test.ts
 */
export function invertedLCapacitance(
  riser: Metre,
  top: Metre,
  radius: Metre,
  method: 'two-section' | 'uniform' = 'two-section',
): Farad {
  const n11 = 2 * riser * parallel(riser, radius) - collinear(riser, 0);
  const n22 = 2 * top * (parallel(top, radius) - parallel(top, 2 * riser));
  const n12 = 2 * corner(top, riser) - corner(top, 2 * riser);
  const scale = 4 * PI * EPSILON_0;
  if (method === 'uniform') return (scale * (riser + top) * (riser + top)) / (n11 + n22 + 2 * n12);
  const p11 = n11 / (riser * riser);
  const p22 = n22 / (top * top);
  const p12 = n12 / (riser * top);
  return (scale * (p11 + p22 - 2 * p12)) / (p11 * p22 - p12 * p12);
}

/** Capacitance of a wire aerial without its site factor; horizontal 0 is a plain vertical wire from the ground. */
export function wireCapacitance(vertical: Metre, horizontal: Metre, radius: Metre): Farad {
  return horizontal === 0
    ? verticalCapacitance(vertical, radius, 0)
    : invertedLCapacitance(vertical, horizontal, radius);
}

/**
 * Reactance of a wire of total length S as an open line with the speed of light. Range: up to 2.2 radian of wire. Error
 * against nec2c over perfect ground: 1.7 % to 0.9 radian, 3.5 % to 1.3; bent wires beyond 7 % or 8 ohm; a plain vertical
 * wire 15 ohm to 1.3 radian and 50 ohm beyond, about its quarter wave. An earth adds 10 to 150 ohm.
 * @see receiver.md B2, B3
 */
export function lineReactance(length: Metre, capacitance: Farad, f: Hertz): Ohm {
  positive('capacitance', capacitance);
  return -length / (LIGHT_SPEED * capacitance) / tan((TWO_PI * f * length) / LIGHT_SPEED);
}

/** Inductance of the series circuit that a bench dummy has in place of the line. */
export function lineInductance(length: Metre, capacitance: Farad): Henry {
  return (length * length) / (3 * LIGHT_SPEED * LIGHT_SPEED * capacitance);
}

/**
 * Effective height: EMF over vertical field, riser at the set's end, for the current of an open line. @see receiver.md
 * B2
 */
export function effectiveHeight(vertical: Metre, horizontal: Metre, f: Hertz): Metre {
  const k = (TWO_PI * f) / LIGHT_SPEED;
  const s = k * (vertical + horizontal);
  // cos(a) - cos(b) as a product keeps the digits of short wires.
  return (2 * sin((s + k * horizontal) / 2) * sin((s - k * horizontal) / 2)) / (k * sin(s));
}

/**
 * Radiation resistance over perfect ground. Against nec2c: 4 % for straight wires to 1.3 radian; bent ones 7 % to 0.9, 16 %
 * to 1.3, and up to half too low at 2.2. Always small against the earth.
 * @see receiver.md B2; test/reference/nec2c.test.ts
 */
export function radiationResistance(height: Metre, f: Hertz): Ohm {
  const kh = ((TWO_PI * f) / LIGHT_SPEED) * height;
  return 40 * kh * kh;
}

/**
 * Low-frequency resistance of one driven rod (Dwight); its resistance at radio frequency has no fixed relation to it.
 */
export function earthRod(length: Metre, radius: Metre, resistivity: number): Ohm {
  return (resistivity / (TWO_PI * length)) * (log((4 * length) / radius) - 1);
}

/** Dummy aerial: c1 in series with l, l across (c2 + r). */
export function dummyAerial(part: { c1: Farad; l: Henry; c2: Farad; r: Ohm }, f: Hertz): { r: Ohm; x: Ohm } {
  const w = TWO_PI * f;
  const xl = w * part.l;
  const x2 = -1 / (w * part.c2);
  // j xl (r + j x2) / (r + j (xl + x2))
  const d = part.r * part.r + (xl + x2) * (xl + x2);
  const r = (xl * xl * part.r) / d;
  const x = (xl * (part.r * part.r + x2 * (xl + x2))) / d;
  return { r, x: x - 1 / (w * part.c1) };
}
