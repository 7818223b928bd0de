import { wireCapacitance } from '../aerial/wire';
import type { Design } from '../design';
import { at } from '../numeric/cells';
import { LIMITS } from '../schema/limits';
import type { Circuit } from './circuit';
import { sameAsBefore, type Filler } from './filler';
import type { Values } from './values';

/** Stands for an earth where there is none: the set's own counterpoise (ours). */
const COUNTERPOISE_C = 30e-12;
const COUNTERPOISE_R = 100;

function wireFiller(wire: Extract<Design['aerial'], { kind: 'wire' }>, values: Values): Filler {
  const vertical = values.add('aerial.vertical', wire.vertical, LIMITS.wireLength);
  const horizontal = wire.horizontal === 0 ? null : values.add('aerial.horizontal', wire.horizontal, LIMITS.wireLength);
  const radius = values.add('aerial.radius', wire.radius, LIMITS.wireRadius);
  const site = values.add('aerial.siteFactor', wire.siteFactor, LIMITS.siteFactor);
  const unchanged = sameAsBefore(3);
  let bare = 0;
  return (x, circuit) => {
    circuit.wire = true;
    circuit.vertical = at(x, vertical);
    circuit.horizontal = horizontal === null ? 0 : at(x, horizontal);
    if (!unchanged(circuit.vertical, circuit.horizontal, at(x, radius))) {
      bare = wireCapacitance(circuit.vertical, circuit.horizontal, at(x, radius));
    }
    if (!(bare > 0)) circuit.sound = false;
    circuit.aerialC = at(x, site) * bare;
  };
}

export function aerialFiller({ aerial, earth }: Design, values: Values): Filler {
  let ofAerial: Filler;
  if (aerial.kind === 'wire') ofAerial = wireFiller(aerial, values);
  else {
    const r = values.add('aerial.r', aerial.r, LIMITS.aerialR);
    const l = values.add('aerial.l', aerial.l, LIMITS.aerialL);
    const c = values.add('aerial.c', aerial.c, LIMITS.aerialC);
    const height = values.add('aerial.effectiveHeight', aerial.effectiveHeight, LIMITS.effectiveHeight);
    ofAerial = (x, circuit) => {
      circuit.aerialR = at(x, r);
      circuit.aerialL = at(x, l);
      circuit.aerialC = at(x, c);
      circuit.height = at(x, height);
    };
  }
  const earthR = earth.kind === 'none' ? null : values.add('earth.r', earth.r, LIMITS.earthR);
  return (x: Float64Array, circuit: Circuit) => {
    ofAerial(x, circuit);
    circuit.earthR = earthR === null ? COUNTERPOISE_R : at(x, earthR);
    circuit.earthC = earthR === null ? COUNTERPOISE_C : 0;
  };
}
