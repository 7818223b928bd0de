import { InvalidInput } from '../invalid-input';
import type { Henry, Metre } from '../units';
import { sections, solenoid, type SolenoidShape } from './solenoid';

export interface WantedCoil {
  target: Henry;
  formerDiameter: Metre;
  wireBare: Metre;
  wireOverall: Metre;
  layFactor?: number | undefined;
  /** Length of the former and bare margin at each end; without it up to 1000 turns. */
  formerLength?: number | undefined;
  margin?: number | undefined;
}

export interface WoundChoice {
  turns: number;
  inductance: Henry;
  length: Metre;
}

/** Whole turns whose inductance is nearest to the target (by ratio), pitch kept. Refused when the former is too short. */
export function turnsFor(wanted: WantedCoil): WoundChoice {
  const { target, formerDiameter, wireBare, wireOverall, layFactor = 1.03, formerLength, margin = 0.005 } = wanted;
  const pitch = layFactor * wireOverall;
  const shape = { diameter: formerDiameter + wireOverall, pitch, wireBare };
  const most = formerLength === undefined ? 1000 : Math.floor((formerLength - 2 * margin) / pitch);
  const at = (turns: number): Henry => solenoid({ ...shape, turns });
  if (most < 1 || at(most) < target) {
    throw new InvalidInput([
      {
        path: 'formerLength',
        message: 'The former is too short for this inductance: take a longer former or thinner wire.',
      },
    ]);
  }
  let low = 1;
  let high = most;
  while (high - low > 1) {
    const middle = Math.floor((low + high) / 2);
    if (at(middle) <= target) low = middle;
    else high = middle;
  }
  const turns = target / at(low) <= at(high) / target ? low : high;
  return { turns, inductance: at(turns), length: turns * pitch };
}

/** Whole turns of a tap whose voltage ratio (L1 + M)/L is nearest to the wanted one; ties go lower. */
export function tapFor(shape: SolenoidShape & { voltageRatio: number }): { turns: number; ratio: number } {
  const whole = solenoid(shape);
  let best = { turns: 1, ratio: Infinity };
  for (let tapTurns = 1; tapTurns < shape.turns; tapTurns += 1) {
    const { l1, m } = sections({ ...shape, tapTurns });
    const ratio = (l1 + m) / whole;
    if (Math.abs(ratio - shape.voltageRatio) < Math.abs(best.ratio - shape.voltageRatio))
      best = { turns: tapTurns, ratio };
  }
  return best;
}
