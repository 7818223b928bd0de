import type { Design, FoilForm, GangForm } from '../design';
import { foilMinimum } from '../capacitors/plates';
import { at } from '../numeric/cells';
import { log } from '../numeric/exp-log';
import { LIMITS } from '../schema/limits';
import { EPSILON_0, TWO_PI, type Farad } from '../units';
import type { Circuit } from './circuit';
import type { Filler } from './filler';
import type { Values } from './values';

function foilFiller(path: string, foil: FoilForm, values: Values): Filler {
  const travel = values.add(`${path}.travel`, foil.travel, LIMITS.foilSide);
  const width =
    foil.form === 'plates'
      ? values.add(`${path}.width`, foil.width, LIMITS.foilSide)
      : values.add(`${path}.innerRadius`, foil.innerRadius, LIMITS.foilRadius);
  const thickness: number[] = [];
  const permittivity: number[] = [];
  foil.layers.forEach(([t, e], index) => {
    thickness.push(values.add(`${path}.layers.${index}.0`, t, LIMITS.layerThickness));
    permittivity.push(values.add(`${path}.layers.${index}.1`, e, LIMITS.permittivity));
  });
  const least = foil.min === undefined ? null : values.add(`${path}.min`, foil.min, LIMITS.tuned);
  const loss = foil.tan === undefined ? null : values.add(`${path}.tan`, foil.tan, LIMITS.lossTangent);
  const faces = foil.form === 'plates' ? foil.faces : 1;
  return (x, circuit) => {
    let gap = 0;
    let radius = at(x, width);
    for (let i = 0; i < thickness.length; i += 1) {
      const t = at(x, thickness[i] ?? 0);
      const e = at(x, permittivity[i] ?? 0);
      gap += foil.form === 'plates' ? t / e : log((radius + t) / radius) / e;
      radius += t;
    }
    const area = foil.form === 'plates' ? faces * at(x, width) * at(x, travel) : TWO_PI * at(x, travel);
    const full = (EPSILON_0 * area) / gap;
    circuit.cMin = least === null ? foilMinimum(full) : at(x, least);
    circuit.cMax = circuit.cMin + full;
    circuit.foilTan = loss === null ? 0 : at(x, loss);
  };
}

function gangFiller(path: string, gang: GangForm, values: Values): Filler {
  if (gang.kind === 'foil') return foilFiller(path, gang, values);
  const min = values.add(`${path}.min`, gang.min, LIMITS.tuned);
  const max = values.add(`${path}.max`, gang.max, LIMITS.tuned);
  return (x, circuit) => {
    circuit.cMin = at(x, min);
    circuit.cMax = at(x, max);
    if (circuit.cMin >= circuit.cMax) circuit.sound = false;
  };
}

function fixedFiller(index: number): Filler {
  return (x, circuit) => {
    circuit.cMin = at(x, index);
    circuit.cMax = at(x, index);
  };
}

function elementFiller({ tuning }: Design, values: Values): Filler {
  if (tuning.kind === 'capacitor' || tuning.kind === 'foil') return gangFiller('tuning', tuning, values);
  if (tuning.kind === 'inductance') {
    const min = values.add('tuning.min', tuning.min, LIMITS.inductance);
    const max = values.add('tuning.max', tuning.max, LIMITS.inductance);
    const fixed = fixedFiller(values.add('tuning.c', tuning.c, LIMITS.tuned));
    return (x, circuit) => {
      circuit.positionMin = at(x, min);
      circuit.positionMax = at(x, max);
      if (circuit.positionMin >= circuit.positionMax) circuit.sound = false;
      fixed(x, circuit);
    };
  }
  const { c, minTurns, maxTurns } = tuning;
  const gang = typeof c === 'object' && 'kind' in c;
  const ofC = gang ? gangFiller('tuning.c', c, values) : fixedFiller(values.add('tuning.c', c, LIMITS.sliderC));
  return (x, circuit) => {
    circuit.positionMin = minTurns;
    circuit.positionMax = maxTurns;
    ofC(x, circuit);
  };
}

/** Padder in series with (tuning capacitor + trimmer). */
function throughPadder(c: Farad, padder: Farad, trimmer: Farad): Farad {
  const across = c + trimmer;
  return padder === 0 ? across : (padder * across) / (padder + across);
}

/** Tuning element, padder and trimmer: the ends of the capacitance the circuit sees. */
export function tuningFiller(design: Design, values: Values): Filler {
  const element = elementFiller(design, values);
  const padder = design.padder === undefined ? null : values.add('padder', design.padder, LIMITS.padder);
  const trimmer = design.trimmer === undefined ? null : values.add('trimmer', design.trimmer, LIMITS.padder);
  if (padder === null && trimmer === null) return element;
  return (x: Float64Array, circuit: Circuit) => {
    element(x, circuit);
    const series = padder === null ? 0 : at(x, padder);
    const across = trimmer === null ? 0 : at(x, trimmer);
    circuit.cMin = throughPadder(circuit.cMin, series, across);
    circuit.cMax = throughPadder(circuit.cMax, series, across);
  };
}
