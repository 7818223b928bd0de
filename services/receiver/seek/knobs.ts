import { neighbour } from '../capacitors/preferred';
import type { Design } from '../design';
import { shownQuantity } from '../findings/finding';
import { partName } from '../findings/part-name';
import { centre, type Value } from '../schema/value';
import type { Change } from '../verdict';
import { changeTo, changeValue, readAt, threeFigures } from './changes';

/** One possible change of a design, with the sentence that tells a person to make it. */
export interface Step {
  text: string;
  changes: Change[];
}

/** Changes of one kind, the smallest first. */
export type Knob = Iterable<Step>;

/** Relative step and number of steps of a scaled value: up to about three times, or down to a third. */
const STEP = 0.02;
const SCALES = 56;
/** Most turns added or taken away. */
const MOST_TURNS = 400;

function* scaled(input: unknown, path: string, value: Value | undefined, direction: 'up' | 'down', unit: string): Knob {
  if (value === undefined) return;
  const now = centre(value);
  if (now === 0) return;
  let factor = 1;
  for (let i = 0; i < SCALES; i += 1) {
    factor *= direction === 'up' ? 1 + STEP : 1 - STEP;
    const to = threeFigures(now * factor, direction);
    yield {
      text: `Change the ${partName(path)} from ${shownQuantity(now, unit)} to ${shownQuantity(to, unit)}.`,
      changes: [changeValue(input, path, to)],
    };
  }
}

function* turns(input: unknown, path: string, now: number, direction: 'up' | 'down', word: string): Knob {
  for (let n = 1; n <= MOST_TURNS; n += n < 40 ? 1 : 5) {
    const to = direction === 'up' ? now + n : now - n;
    if (to < 1) return;
    yield { text: `${word} ${to} turns instead of ${now}.`, changes: [changeTo(input, path, to)] };
  }
}

/** More or less inductance of the coil, by whole turns where it is wound. */
export function inductance(design: Design, input: unknown, direction: 'up' | 'down'): Knob {
  const { coil, tuning } = design;
  if (tuning.kind === 'inductance') {
    const path = direction === 'up' ? 'tuning.max' : 'tuning.min';
    return scaled(input, path, direction === 'up' ? tuning.max : tuning.min, direction, 'H');
  }
  if (tuning.kind === 'slider') return sliderTurns(design, input, direction);
  if (coil.kind === 'measured')
    return coil.sections === undefined
      ? scaled(input, 'coil.l', coil.l, direction, 'H')
      : factor(design, input, direction);
  if (coil.kind === 'multilayer')
    return turns(input, 'coil.turnsPerLayer', coil.turnsPerLayer, direction, 'Wind each layer with');
  return turns(input, 'coil.turns', coil.turns, direction, 'Wind');
}

function* factor({ coil }: Design, input: unknown, direction: 'up' | 'down'): Knob {
  const now = coil.lFactor === undefined ? 1 : centre(coil.lFactor);
  let scale = 1;
  for (let i = 0; i < SCALES; i += 1) {
    scale *= direction === 'up' ? 1 + STEP : 1 - STEP;
    const to = threeFigures(now * scale, direction);
    const percent = Math.round((to / now - 1) * 100);
    const text = `Take a coil of ${Math.abs(percent)} % ${percent > 0 ? 'more' : 'less'} inductance.`;
    yield { text, changes: [changeValue(input, 'coil.lFactor', to)] };
  }
}

function* sliderTurns({ tuning, coil }: Design, input: unknown, direction: 'up' | 'down'): Knob {
  if (tuning.kind !== 'slider' || coil.kind !== 'solenoid') return;
  if (direction === 'down') {
    for (const step of turns(input, 'tuning.minTurns', tuning.minTurns, 'down', 'Let the slider go down to'))
      yield step;
    return;
  }
  for (let n = 1; n <= MOST_TURNS; n += n < 40 ? 1 : 5) {
    const to = tuning.maxTurns + n;
    const changes = [changeTo(input, 'tuning.maxTurns', to)];
    if (to > coil.turns) changes.unshift(changeTo(input, 'coil.turns', to));
    yield { text: `Let the slider go up to ${to} turns instead of ${tuning.maxTurns}.`, changes };
  }
}

/** A wider tuning element at one end. */
export function* tuningEnd(design: Design, input: unknown, end: 'min' | 'max'): Knob {
  const { tuning } = design;
  const gang = tuning.kind === 'slider' && typeof tuning.c === 'object' && 'kind' in tuning.c ? tuning.c : tuning;
  const path = gang === tuning ? 'tuning' : 'tuning.c';
  const direction = end === 'max' ? 'up' : 'down';
  if (gang.kind === 'capacitor') yield* scaled(input, `${path}.${end}`, gang[end], direction, 'F');
  if (gang.kind === 'foil' && end === 'max') yield* scaled(input, `${path}.travel`, gang.travel, 'up', 'm');
  if (gang.kind === 'foil' && end === 'min') yield* scaled(input, `${path}.min`, gang.min, 'down', 'F');
}

export function padderUp({ padder }: Design, input: unknown): Knob {
  return scaled(input, 'padder', padder, 'up', 'F');
}

export function trimmerDown({ trimmer }: Design, input: unknown): Knob {
  return scaled(input, 'trimmer', trimmer, 'down', 'F');
}

export function strayDown({ stray }: Design, input: unknown): Knob {
  return scaled(input, 'stray', stray, 'down', 'F');
}

/** Aerial coupled more loosely: a smaller capacitor of the series, a lower tap, a smaller primary. */
export function* looser({ coupling, coil, tuning }: Design, input: unknown): Knob {
  if (coupling.kind === 'series-c') {
    let c = centre(coupling.c);
    const now = c;
    while (c > 0.5e-12) {
      c = neighbour('E12', c, 'down');
      const text = `Take a coupling capacitor of ${shownQuantity(c, 'F')} instead of ${shownQuantity(now, 'F')}.`;
      yield { text, changes: [changeValue(input, 'coupling.c', c)] };
    }
  }
  if (coupling.kind === 'direct') {
    for (const c of [100e-12, 68e-12, 47e-12, 33e-12, 22e-12, 15e-12, 10e-12, 6.8e-12, 4.7e-12]) {
      const text = `Couple the aerial through a capacitor of ${shownQuantity(c, 'F')}.`;
      yield { text, changes: [changeTo(input, 'coupling', { kind: 'series-c', c })] };
    }
  }
  const tap = coil.taps?.aerial;
  if (coupling.kind === 'aerial-tap' && tap !== undefined && coil.kind !== 'measured' && tuning.kind !== 'slider') {
    const stride = coil.kind === 'multilayer' ? coil.turnsPerLayer : 1;
    for (let to = tap - stride; to >= 1; to -= stride) {
      yield {
        text: `Put the aerial on turn ${to} instead of ${tap}.`,
        changes: [changeTo(input, 'coil.taps.aerial', to)],
      };
    }
  }
  if (coupling.kind !== 'primary') return;
  if (coupling.turns !== undefined)
    yield* turns(input, 'coupling.turns', coupling.turns, 'down', 'Wind the primary with');
  else {
    yield* scaled(input, 'coupling.l', coupling.l, 'down', 'H');
    yield* scaled(input, 'coupling.k', coupling.k, 'down', '1');
  }
}

/** The detector on a tap of the coil, from the upper turns down. */
export function* detectorTap({ coil, detectorAt, tuning }: Design, input: unknown): Knob {
  if (tuning.kind === 'slider' || tuning.kind === 'inductance') return;
  const now = detectorAt === 'tap' ? coil.taps?.detector : undefined;
  const to = (tap: number): Step => {
    const changes = [changeTo(input, 'coil.taps', { ...coil.taps, detector: tap })];
    if (detectorAt !== 'tap') changes.push(changeTo(input, 'detectorAt', 'tap'));
    const where = coil.kind === 'measured' ? `section ${tap}` : `turn ${tap}`;
    return { text: `Put the detector on a tap at ${where}.`, changes };
  };
  if (coil.kind === 'measured') {
    const size = coil.sections?.length ?? 1;
    for (let tap = (now ?? size) - 1; tap >= 1; tap -= 1) yield to(tap);
    return;
  }
  const whole = coil.kind === 'multilayer' ? coil.layers * coil.turnsPerLayer : coil.turns;
  const stride = coil.kind === 'multilayer' ? coil.turnsPerLayer : Math.max(1, Math.floor(whole / 24));
  for (let tap = (now ?? whole) - stride; tap >= 1; tap -= stride) yield to(tap);
}

/** A better coil: a higher Q of its own, up to three times. */
export function* betterCoil({ coil }: Design, input: unknown): Knob {
  if (coil.q === undefined) return;
  const now = centre(coil.q);
  for (const part of [1.2, 1.4, 1.7, 2, 2.5, 3]) {
    const to = threeFigures(now * part, 'up');
    yield {
      text: `Take a coil with a Q of ${to} instead of ${Number(now.toPrecision(3))}.`,
      changes: [changeValue(input, 'coil.q', to)],
    };
  }
}

/** Most values held closer together. */
const MOST_HELD = 3;

/**
 * Closer tolerance of the values that carry the most variance: the first alone, then the first two, then three. Measured
 * lots stay as they are.
 */
export function* closer(input: unknown, paths: readonly string[]): Knob {
  const open = paths.filter((path) => {
    const tol = readAt(input, `${path}.tol`);
    return typeof tol === 'number' && tol > 0 && readAt(input, `${path}.lot`) === undefined;
  });
  for (let count = 1; count <= Math.min(MOST_HELD, open.length); count += 1) {
    for (const part of [0.75, 0.5, 0.25]) {
      const held = open
        .slice(0, count)
        .map((path) => ({ path, to: Number((Number(readAt(input, `${path}.tol`)) * part).toPrecision(3)) }));
      const changes = held.flatMap(({ path, to }) => {
        const own = [changeTo(input, `${path}.tol`, to)];
        if (Number(readAt(input, `${path}.bin`)) > to) own.push(changeTo(input, `${path}.bin`, to));
        return own;
      });
      const words = held.map(({ path, to }) => `the ${partName(path)} to ${Number((to * 100).toPrecision(3))} %`);
      yield { text: `Hold ${words.join(', ')}.`, changes };
    }
  }
}

/** The first steps of a knob only. */
export function* first(knob: Knob, count: number): Knob {
  let left = count;
  for (const step of knob) {
    if (left <= 0) return;
    left -= 1;
    yield step;
  }
}
