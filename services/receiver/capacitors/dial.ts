import { TWO_PI, type Farad, type Henry, type Hertz, type Metre } from '../units';
import { gang, type GangShape } from './gang';

/** Room on a dial: radius of the label arc, width of a label along it, gap between two, and the ranks of round numbers. */
export interface DialRoom {
  lo: Hertz;
  hi: Hertz;
  radius: Metre;
  width: Metre;
  gap: Metre;
  /** Multiples in falling rank: 200, 100, 50 kHz for medium wave. */
  ranks: readonly Hertz[];
}

export interface DialMark {
  f: Hertz;
  angle: number;
  rank: number;
}

/** Labels that fit, ends first, then rank by rank in rising frequency, in the order of angle. */
export function labelsThatFit(room: DialRoom, angleOf: (f: Hertz) => number): DialMark[] {
  const { lo, hi, radius, width, gap, ranks } = room;
  const kept: DialMark[] = [
    { f: lo, angle: angleOf(lo), rank: 0 },
    { f: hi, angle: angleOf(hi), rank: 0 },
  ];
  ranks.forEach((step, index) => {
    for (let n = Math.ceil(lo / step); n * step <= hi; n += 1) {
      const angle = angleOf(n * step);
      if (kept.every((mark) => radius * Math.abs(angle - mark.angle) >= width + gap)) {
        kept.push({ f: n * step, angle, rank: index + 1 });
      }
    }
  });
  return kept.sort((a, b) => a.angle - b.angle || a.f - b.f);
}

/** Labels of the dial of a bare circuit: inductance, stray and a gang. */
export function dialLabels(dial: GangShape & DialRoom & { stray: Farad; inductance: Henry }): Hertz[] {
  const law = gang(dial);
  const angleOf = (f: Hertz): number => law.angleOf(1 / (TWO_PI * f * (TWO_PI * f) * dial.inductance) - dial.stray);
  return labelsThatFit(dial, angleOf).map((mark) => mark.f);
}
