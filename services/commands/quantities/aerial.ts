import {
  dummyAerial,
  earthRod,
  effectiveHeight,
  horizontalCapacitance,
  invertedLCapacitance,
  lineInductance,
  lineReactance,
  radiationResistance,
  verticalCapacitance,
  wireCapacitance,
} from '../../receiver/aerial/wire';
import type { Inputs, Quantities } from './inputs';

function capacitance(i: Inputs): number {
  return wireCapacitance(i.number('vertical_m'), i.number('horizontal_m'), i.number('radius_m'));
}

function length(i: Inputs): number {
  return i.number('vertical_m') + i.number('horizontal_m');
}

function height(i: Inputs): number {
  return effectiveHeight(i.number('vertical_m'), i.number('horizontal_m'), i.number('f_hz'));
}

function dummy(i: Inputs): { r: number; x: number } {
  const part = { c1: i.number('c1_f'), l: i.number('l_h'), c2: i.number('c2_f'), r: i.number('r_ohm') };
  return dummyAerial(part, i.number('f_hz'));
}

export const aerialQuantities: Quantities = {
  aerial_capacitance_vertical: (i) =>
    verticalCapacitance(i.number('length_m'), i.number('radius_m'), i.number('base_height_m')),
  aerial_capacitance_horizontal: (i) =>
    horizontalCapacitance(i.number('length_m'), i.number('radius_m'), i.number('height_m')),
  aerial_capacitance_inverted_l: (i) =>
    invertedLCapacitance(
      i.number('vertical_m'),
      i.number('horizontal_m'),
      i.number('radius_m'),
      i.text('method') === 'uniform' ? 'uniform' : 'two-section',
    ),
  aerial_reactance: (i) => lineReactance(length(i), capacitance(i), i.number('f_hz')),
  aerial_series_inductance: (i) => lineInductance(length(i), capacitance(i)),
  effective_height: height,
  radiation_resistance: (i) => radiationResistance(height(i), i.number('f_hz')),
  earth_rod_resistance: (i) =>
    earthRod(i.number('rod_length_m'), i.number('rod_radius_m'), i.number('resistivity_ohm_m')),
  dummy_aerial_resistance: (i) => dummy(i).r,
  dummy_aerial_reactance: (i) => dummy(i).x,
};
