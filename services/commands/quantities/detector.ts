import {
  diode,
  efficiency,
  forwardVoltage,
  inputResistance,
  outputResistance,
  rectify,
  rectifyBehind,
  saturationCurrent,
  zeroBiasResistance,
  type Diode,
  type Rectified,
} from '../../receiver/detector/diode';
import { audioCorner, capacitorImpedance, powerShare, sensationLevel } from '../../receiver/earphone/loads';
import { lnBesselI0 } from '../../receiver/numeric/bessel';
import { THERMAL_VOLT } from '../../receiver/units';
import type { Inputs, Quantities } from './inputs';

function junction(i: Inputs): Diode {
  return diode(i.number('is_a'), i.number('n'), i.number('temperature_k'));
}

function ideal(i: Inputs): Rectified {
  return rectify(junction(i), i.number('v_peak'), i.number('r_load_ohm'));
}

function behind(i: Inputs): Rectified {
  return rectifyBehind(junction(i), i.number('v_open'), i.number('r_source_ohm'), i.number('r_load_ohm'));
}

export const detectorQuantities: Quantities = {
  rectified_voltage: (i) => ideal(i).vdc,
  rf_input_resistance: (i) => inputResistance(junction(i), ideal(i)),
  rectification_efficiency: (i) => efficiency(ideal(i), i.number('r_load_ohm')),
  detector_output_resistance: (i) => outputResistance(junction(i), ideal(i).idc),
  detector_rf_voltage_from_source: (i) => behind(i).v,
  rectified_voltage_from_source: (i) => behind(i).vdc,
  zero_bias_resistance: (i) => zeroBiasResistance(junction(i)),
  forward_voltage: (i) => forwardVoltage(junction(i), i.number('i_a'), i.number('rs_ohm')),
  saturation_current_from_vf: (i) =>
    saturationCurrent(
      i.number('vf'),
      i.number('i_a'),
      i.number('n') * THERMAL_VOLT * i.number('temperature_k'),
      i.number('rs_ohm'),
    ),
  ln_bessel_i0: (i) => lnBesselI0(i.number('x')),
  ceramic_impedance: (i) => capacitorImpedance(i.number('c_f'), i.number('f_hz')),
  audio_power_fraction: (i) =>
    powerShare(i.number('r_source_ohm'), { r: i.number('load_r_ohm'), x: i.number('load_x_ohm') }),
  audio_corner: (i) => audioCorner(i.number('r_detector_ohm'), i.number('r_return_ohm'), i.number('c_total_f')),
  sensation_level: (i) => sensationLevel(i.number('p_audio_w'), i.number('p_threshold_w')),
};
