import { bandOf, carrierCount, nearestCarrier, nthCarrier, type BandEntry } from '../../receiver/bands';
import {
  flatEarthLimit,
  numericalDistance,
  perfectGroundField,
  phaseConstant,
  sommerfeld,
  vanDerPol,
  type Ground,
} from '../../receiver/range/ground-wave';
import { manMadeNoise, noiseField, type Environment } from '../../receiver/range/noise';
import { log10 } from '../../receiver/numeric/exp-log';
import type { Inputs, Quantities } from './inputs';

function band(i: Inputs): BandEntry {
  const found = bandOf(i.text('band'), i.has('region') ? i.number('region') : undefined);
  return {
    ...found,
    firstCarrier: i.number('first_hz', found.firstCarrier),
    lastCarrier: i.number('last_hz', found.lastCarrier),
  };
}

function ground(i: Inputs): Ground {
  return { sigma: i.number('sigma_s_m'), epsilonR: i.number('epsilon_r') };
}

const ENVIRONMENTS: readonly Environment[] = ['city', 'residential', 'rural', 'quiet-rural'];

function environment(i: Inputs): Environment {
  const name = ENVIRONMENTS.find((each) => each === i.text('environment'));
  if (name === undefined) throw new TypeError('The case names no environment.');
  return name;
}

export const bandQuantities: Quantities = {
  band_lower_edge: (i) => band(i).lo,
  band_upper_edge: (i) => band(i).hi,
  first_carrier: (i) => band(i).firstCarrier,
  last_carrier: (i) => band(i).lastCarrier,
  carrier_count: (i) => carrierCount(band(i)),
  channel_step: (i) => band(i).step,
  nth_carrier: (i) => nthCarrier(band(i), i.number('n_from_zero')),
  nearest_carrier: (i) => nearestCarrier(band(i), i.number('f_hz')),
  field_perfect_ground: (i) => perfectGroundField(i.number('p_radiated_w'), i.number('d_m')),
  numerical_distance: (i) => numericalDistance(ground(i), i.number('f_hz'), i.number('d_m')),
  phase_constant_b: (i) => phaseConstant(ground(i), i.number('f_hz')),
  attenuation_norton_vdp: (i) => vanDerPol(ground(i), i.number('f_hz'), i.number('d_m')),
  attenuation_sommerfeld: (i) => sommerfeld(ground(i), i.number('f_hz'), i.number('d_m')),
  field_dbuvm_1kw: (i) =>
    20 *
    log10(1e6 * perfectGroundField(1000, i.number('d_m')) * sommerfeld(ground(i), i.number('f_hz'), i.number('d_m'))),
  flat_earth_limit: (i) => flatEarthLimit(i.number('f_hz')),
  man_made_noise_fa: (i) => manMadeNoise(environment(i), i.number('f_hz')),
  noise_field_dbuvm: (i) => noiseField(i.number('fa_db'), i.number('f_hz'), i.number('bandwidth_hz')),
};
