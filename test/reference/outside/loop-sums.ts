import type { Chance } from './chance';

const MU_0 = 4e-7 * Math.PI;

/**
 * Complete elliptic integrals by Carlson's duplication, which shares nothing with the engine's arithmetic-geometric mean:
 * K = RF(0, y, 1), E = K - k^2 RD(0, y, 1)/3 with y = 1 - k^2.
 */
function elliptic(y: number): { first: number; second: number } {
  return { first: carlsonF(0, y, 1), second: carlsonF(0, y, 1) - ((1 - y) * carlsonD(0, y, 1)) / 3 };
}

function carlsonF(x: number, y: number, z: number): number {
  let [a, b, c] = [x, y, z];
  for (let i = 0; i < 40; i += 1) {
    const l = Math.sqrt(a * b) + Math.sqrt(b * c) + Math.sqrt(a * c);
    [a, b, c] = [(a + l) / 4, (b + l) / 4, (c + l) / 4];
    if (Math.abs(a - c) + Math.abs(b - c) < 1e-4 * c) break;
  }
  const mean = (a + b + c) / 3;
  const [p, q, r] = [1 - a / mean, 1 - b / mean, 1 - c / mean];
  const [e2, e3] = [p * q - r * r, p * q * r];
  return (1 - e2 / 10 + e3 / 14 + (e2 * e2) / 24) / Math.sqrt(mean);
}

function carlsonD(x: number, y: number, z: number): number {
  let [a, b, c] = [x, y, z];
  let sum = 0;
  let power = 1;
  for (let i = 0; i < 40; i += 1) {
    const l = Math.sqrt(a * b) + Math.sqrt(b * c) + Math.sqrt(a * c);
    sum += power / (Math.sqrt(c) * (c + l));
    power /= 4;
    [a, b, c] = [(a + l) / 4, (b + l) / 4, (c + l) / 4];
    if (Math.abs(a - c) + Math.abs(b - c) < 1e-4 * c) break;
  }
  const mean = (a + b + 3 * c) / 5;
  const [p, q, r] = [1 - a / mean, 1 - b / mean, 1 - c / mean];
  const [ea, eb] = [p * q, r * r];
  const [ec, ed] = [ea - eb, ea - 6 * eb];
  const tail = 1 + ed * (-3 / 14 + (9 / 88) * ed - (9 / 52) * r * (ed + 2 * ec));
  const rest = r * ((1 / 6) * (ed + 2 * ec) + r * (-(9 / 22) * ec + r * (3 / 26) * ea));
  return 3 * sum + (power * (tail + rest)) / (mean * Math.sqrt(mean));
}

/** Mutual inductance of two coaxial filaments. */
export function filaments(r1: number, r2: number, z: number): number {
  const far = (r1 + r2) ** 2 + z * z;
  const y = ((r1 - r2) ** 2 + z * z) / far;
  const k = Math.sqrt(1 - y);
  const { first, second } = elliptic(y);
  return MU_0 * Math.sqrt(r1 * r2) * ((2 / k - k) * first - (2 / k) * second);
}

export interface Coil {
  turns: number;
  /** Wire centre to wire centre. */
  diameter: number;
  pitch: number;
  wireBare: number;
  highFrequency: boolean;
}

/** Inductance of a solenoid as so many coaxial rings of round wire. */
export function ringSum({ turns, diameter, pitch, wireBare, highFrequency }: Coil): number {
  const a = diameter / 2;
  let sum = turns * MU_0 * a * (Math.log((16 * a) / wireBare) - 2 + (highFrequency ? 0 : 0.25));
  for (let n = 1; n < turns; n += 1) sum += 2 * (turns - n) * filaments(a, a, n * pitch);
  return sum;
}

/** A winding within the limits of the form: wire to a fifth of the diameter, pitch to a third, l/D from 0.02 to 20. */
export function randomCoil(chance: Chance): Coil {
  for (;;) {
    const former = chance.log(3e-3, 0.5);
    const wireBare = chance.log(0.03e-3, Math.min(3e-3, former / 6));
    const overall = wireBare + chance.linear(0.02, 0.3) * Math.min(wireBare, 0.5e-3);
    const diameter = former + overall;
    const pitch = overall * chance.log(1, Math.min(12, diameter / 3 / overall));
    const turns = Math.round(chance.log(1, 1000));
    const ratio = (turns * pitch) / diameter;
    if (wireBare <= diameter / 5 && pitch <= diameter / 3 && ratio >= 0.02 && ratio <= 20)
      return { turns, diameter, pitch, wireBare, highFrequency: chance.coin() };
  }
}

/** Inductance of a pile of coaxial rings of one wire, current on its surface. */
export function pileSum(rings: readonly { r: number; z: number }[], wireBare: number): number {
  let sum = 0;
  rings.forEach((one, i) => {
    sum += MU_0 * one.r * (Math.log((16 * one.r) / wireBare) - 2);
    for (const other of rings.slice(i + 1)) sum += 2 * filaments(one.r, other.r, other.z - one.z);
  });
  return sum;
}
