import { positive } from '../invalid-input';
import { log } from '../numeric/exp-log';
import { MU_0, type Henry, type Metre } from '../units';
import { WHEELER } from './nagaoka';
import { loopsInductance, type Loops } from './loops';

export interface SpiralShape {
  turns: number;
  innerDiameter: Metre;
  pitch: Metre;
  wireBare: Metre;
  /** Half the distance between the faces a spider-web changes between; 0 is a flat spiral. */
  offset?: number | undefined;
  highFrequency?: boolean | undefined;
}

/** The turns of a flat or alternating spiral, the innermost first. */
export function spiralLoops(shape: SpiralShape, offset: Metre): Loops {
  const { turns, innerDiameter, pitch, wireBare, highFrequency = true } = shape;
  const radius = new Float64Array(turns);
  const height = new Float64Array(turns);
  for (let i = 0; i < turns; i += 1) {
    radius[i] = innerDiameter / 2 + pitch * (i + 0.5);
    height[i] = i % 2 === 0 ? offset : -offset;
  }
  return { radius, height, wireBare, highFrequency };
}

/**
 * Inductance of turns `from` to `to` of a spiral as a sum over concentric loops. A spider-web lies between the flat and
 * the fully alternating sum; the mean of both is within 2 % (nine coils). A flat spiral's sum has 1e-9 against Carlson's
 * integrals.
 * @see coils-and-capacitors.md B1, B2
 */
export function spiralRange(shape: SpiralShape, from: number, to: number): Henry {
  const flat = loopsInductance(spiralLoops(shape, 0), from, to);
  const { offset = 0 } = shape;
  return offset === 0 ? flat : (flat + loopsInductance(spiralLoops(shape, offset), from, to)) / 2;
}

export function spiral(shape: SpiralShape): Henry {
  positive('innerDiameter', shape.innerDiameter);
  positive('pitch', shape.pitch);
  return spiralRange(shape, 0, shape.turns);
}

/** Quick check, +-2 %. */
export function spiralWheeler({ turns, innerDiameter, pitch }: Omit<SpiralShape, 'wireBare'>): Henry {
  const depth = turns * pitch;
  const mean = innerDiameter / 2 + depth / 2;
  return (WHEELER * mean * mean * turns * turns) / (8 * mean + 11 * depth);
}

/** Quick check by the current sheet of Mohan, +-1 %. */
export function spiralMohan({ turns, innerDiameter, pitch }: Omit<SpiralShape, 'wireBare'>): Henry {
  const outer = innerDiameter + 2 * turns * pitch;
  const mean = (outer + innerDiameter) / 2;
  const fill = (outer - innerDiameter) / (outer + innerDiameter);
  return (MU_0 * turns * turns * mean * (log(2.46 / fill) + 0.2 * fill * fill)) / 2;
}
