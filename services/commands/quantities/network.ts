import { marginsOf } from '../../receiver/coverage/reach';
import { resonance } from '../../receiver/coils/self-capacitance';
import { emptyCircuit, type Circuit } from '../../receiver/network/circuit';
import { capacitanceNeeded, voltagePerEmf } from '../../receiver/network/solve';
import { bandwidthAt } from '../../receiver/network/point';
import { decibel } from '../../receiver/numeric/exp-log';
import { brent } from '../../receiver/numeric/roots';
import type { Inputs, Quantities } from './inputs';

/** The circuit of a case: aerial, coil with a fixed resistance, load, and the coupling it names. */
function circuit(i: Inputs): Circuit {
  const made = emptyCircuit();
  made.aerialR = i.number('aerial_r_ohm');
  made.aerialL = i.number('aerial_l_h');
  made.aerialC = i.number('aerial_c_f');
  made.loss = 'r';
  made.r = i.number('coil_r_ohm');
  made.cSelf = i.number('coil_c_f');
  made.loadG = 1 / i.number('load_r_ohm');
  made.cj = i.number('load_c_f');
  const form = i.text('circuit');
  const lower = i.number('l_lower_h', NaN);
  if (lower > 0) {
    const upper = i.number('l_upper_h');
    const mutual = (i.number('coil_l_h') - lower - upper) / 2;
    made.sections = 2;
    made.m.set([lower, mutual, 0, mutual, upper, 0]);
    made.share.set([lower / (lower + upper), upper / (lower + upper)]);
    made.aerialNode = form === 'aerial-tap' ? 0 : 1;
    made.detectorNode = form === 'series-c-detector-tap' ? 0 : 1;
  } else {
    made.m[0] = i.number('coil_l_h');
    made.share[0] = 1;
  }
  made.l = i.number('coil_l_h');
  made.couplingC = i.number('series_c_f', 0);
  if (form === 'primary') {
    made.primary = true;
    made.primaryL = i.number('primary_l_h');
    made.primaryR = i.number('primary_r_ohm');
    made.primaryK = i.number('k');
    made.aerialNode = made.sections;
  }
  return made;
}

function tuned(i: Inputs): number {
  const made = circuit(i);
  const over = (f: number): number => capacitanceNeeded(made, f) - i.number('tuning_c_f');
  let low = i.number('search_from_hz', 1e5);
  while (over(low * 1.01) > 0 && low < 3e7) low *= 1.01;
  return brent(over, low, low * 1.01);
}

export const networkQuantities: Quantities = {
  tuning_capacitance_needed: (i) => capacitanceNeeded(circuit(i), i.number('f_hz')),
  detector_voltage_per_emf: (i) => voltagePerEmf(circuit(i), i.number('f_hz'), i.number('tuning_c_f')),
  bandwidth_3db: (i) => {
    const made = circuit(i);
    return bandwidthAt(i.number('near_hz'), (f) => voltagePerEmf(made, f, i.number('tuning_c_f')));
  },
  relative_response_db: (i) => {
    const made = circuit(i);
    const at = (f: number): number => voltagePerEmf(made, f, i.number('tuning_c_f'));
    return decibel(at(i.number('f_hz')) / at(i.number('reference_hz')));
  },
  tuned_frequency: tuned,
  tuned_frequency_lossless: (i) => resonance(i.number('l_h'), i.number('c_f')),
  coverage_margin_high: (i) =>
    marginsOf({ lo: 1, hi: i.number('reach_hi_hz') }, { lo: 1, hi: i.number('band_hi_hz') }).hi,
  aerial_detuning: (i) => i.number('with_hz') / i.number('without_hz') - 1,
};
