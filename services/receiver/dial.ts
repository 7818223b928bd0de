import { gang } from './capacitors/gang';
import { labelsThatFit, type DialMark } from './capacitors/dial';
import type { Design } from './design';
import { capacitanceNeeded } from './network/solve';
import { parseDesign } from './parse';
import { centre } from './schema/value';
import { prepared } from './survey';
import type { Farad, Hertz, Metre } from './units';

export interface DialSize {
  /** Radius of the label arc. */
  radius?: Metre | undefined;
  /** Width of a label along the arc. */
  width?: Metre | undefined;
  /** Gap between two labels. */
  gap?: Metre | undefined;
}

/** Round numbers in falling rank, by where the band lies. @see coils-and-capacitors.md I */
function ranksOf({ band }: Design): Hertz[] {
  if (band.hi < 400e3) return [50e3, 10e3];
  return band.lo < 2e6 ? [200e3, 100e3, 50e3] : [500e3, 100e3, 50e3, 10e3];
}

/** The variable's own capacitance behind padder and trimmer. */
function behindPadder(c: Farad, { padder, trimmer }: Design): Farad {
  const series = padder === undefined ? null : centre(padder);
  const across = series === null ? c : c >= series ? Infinity : (series * c) / (series - c);
  return across - (trimmer === undefined ? 0 : centre(trimmer));
}

/**
 * Labels of the printed dial, from the tuning curve with the aerial of the design: frequency, angle from the open stop in
 * radian, and rank. None where the set has no turning capacitor. A hand-made coil is +-3 % of frequency before calibration.
 * @throws InvalidInput with every issue of the design
 */
export function dialMarks(input: unknown, { radius = 0.06, width = 0.008, gap = 0.0015 }: DialSize = {}): DialMark[] {
  const design = parseDesign(input);
  const { tuning, band } = design;
  if (tuning.kind !== 'capacitor') return [];
  const { plan } = prepared(design);
  const turn = centre(tuning.turn);
  const law = gang({ law: tuning.law, min: centre(tuning.min), max: centre(tuning.max), turn });
  const angleOf = (f: Hertz): number => {
    const c = behindPadder(capacitanceNeeded(plan.circuit, f), design);
    const angle = c > 0 ? law.angleOf(c) : -Infinity;
    return Math.min(turn, Math.max(0, angle));
  };
  const room = { lo: band.firstCarrier, hi: band.lastCarrier, radius, width, gap, ranks: ranksOf(design) };
  return labelsThatFit(room, angleOf);
}
