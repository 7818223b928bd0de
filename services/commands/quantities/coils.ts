import { coaxialMutual, loopMutual } from '../../receiver/coils/loops';
import { coilResistance, litzResistance, phi, skin, totalQ } from '../../receiver/coils/loss';
import { multilayer, multilayerWheeler } from '../../receiver/coils/multilayer';
import { nagaoka, nagaokaLundin, sheetInductance, wheelerInductance } from '../../receiver/coils/nagaoka';
import { rodInductance, rodPermeability } from '../../receiver/coils/rod';
import { medhurstH, resonance, selfCapacitance } from '../../receiver/coils/self-capacitance';
import {
  rosaMutual,
  rosaSelf,
  sections,
  solenoid,
  solenoidSensitivity,
  type SolenoidShape,
} from '../../receiver/coils/solenoid';
import { spiral, spiralMohan, spiralWheeler } from '../../receiver/coils/spiral';
import { tapFor, turnsFor, type WantedCoil } from '../../receiver/coils/turns-for';
import {
  awgDiameter,
  closeTurns,
  copper,
  COPPER_TEMPERATURE_COEFFICIENT,
  enamel,
  wireLength,
  wireMass,
  wireResistance,
} from '../../receiver/coils/wire';
import type { Inputs, Quantities } from './inputs';

function shape(i: Inputs): SolenoidShape {
  return {
    turns: i.number('turns'),
    diameter: i.number('diameter'),
    pitch: i.number('pitch'),
    wireBare: i.number('wireBare'),
    highFrequency: i.flag('highFrequency', true),
  };
}

function wanted(i: Inputs): WantedCoil {
  return {
    target: i.number('target'),
    formerDiameter: i.number('formerDiameter'),
    wireBare: i.number('wireBare'),
    wireOverall: i.number('wireOverall'),
    layFactor: i.number('layFactor'),
  };
}

const tapped = (i: Inputs) => sections({ ...shape(i), tapTurns: i.number('tapTurns') });
const flat = (i: Inputs) => ({
  turns: i.number('turns'),
  innerDiameter: i.number('innerDiameter'),
  pitch: i.number('pitch'),
});
const warm = (i: Inputs) => ({ frequency: i.number('frequency'), temperature: i.number('temperature') });
const skinOf = (i: Inputs) => skin(i.number('bare', 1e-3), i.number('frequency'), i.number('temperature'));
const grade = (i: Inputs): 1 | 2 => (i.number('grade') === 2 ? 2 : 1);

export const coilQuantities: Quantities = {
  nagaoka_coefficient: (i) => nagaoka(i.number('diameter'), i.number('length')),
  nagaoka_lundin: (i) => nagaokaLundin(i.number('diameter'), i.number('length')),
  solenoid_inductance_sheet: (i) => sheetInductance(i.number('turns'), i.number('diameter'), i.number('length')),
  solenoid_inductance_wheeler: (i) => wheelerInductance(i.number('turns'), i.number('diameter'), i.number('length')),
  rosa_self: (i) => rosaSelf(i.number('pitch'), i.number('wireBare'), i.flag('highFrequency', true)),
  rosa_mutual: (i) => rosaMutual(i.number('turns')),
  solenoid_inductance: (i) => solenoid(shape(i)),
  loop_mutual: (i) => loopMutual(i.number('r1'), i.number('r2'), i.number('z')),
  tap_section: (i) => tapped(i).l1,
  tap_mutual: (i) => tapped(i).m,
  tap_coupling: (i) => tapped(i).k,
  coaxial_mutual: (i) =>
    coaxialMutual({
      turns1: i.number('turns1'),
      diameter1: i.number('diameter1'),
      pitch1: i.number('pitch1'),
      start1: i.number('start1'),
      turns2: i.number('turns2'),
      diameter2: i.number('diameter2'),
      pitch2: i.number('pitch2'),
      start2: i.number('start2'),
    }),
  spiral_inductance: (i) => spiral({ ...flat(i), wireBare: i.number('wireBare'), offset: i.number('offset', 0) }),
  spiral_wheeler: (i) => spiralWheeler(flat(i)),
  spiral_mohan: (i) => spiralMohan(flat(i)),
  multilayer_inductance: (i) =>
    multilayer({
      innerDiameter: i.number('innerDiameter'),
      length: i.number('length'),
      layers: i.number('layers'),
      turnsPerLayer: i.number('turnsPerLayer'),
      layerPitch: i.number('layerPitch'),
      wireBare: i.number('wireBare'),
    }),
  multilayer_wheeler: (i) =>
    multilayerWheeler(i.number('turns'), i.number('meanRadius'), i.number('length'), i.number('depth')),
  rod_permeability: (i) => rodPermeability(i.number('length'), i.number('diameter'), i.number('muInitial')),
  rod_inductance: (i) =>
    rodInductance({
      rodLength: i.number('rodLength'),
      rodDiameter: i.number('rodDiameter'),
      muInitial: i.number('muInitial'),
      turns: i.number('turns'),
      coilLength: i.number('coilLength'),
      offset: i.number('offset', 0),
    }),
  rod_inductance_from_al: (i) => i.number('al') * i.number('turns') * i.number('turns'),
  rod_al_from_sample: (i) => i.number('inductance') / (i.number('turns') * i.number('turns')),
  awg_diameter: (i) => awgDiameter(i.number('gauge')),
  copper_resistivity: (i) => copper(i.number('temperature')),
  copper_temperature_coefficient: () => COPPER_TEMPERATURE_COEFFICIENT,
  wire_resistance_per_metre: (i) => wireResistance(i.number('bare'), i.number('temperature')),
  wire_mass_per_metre: (i) => wireMass(i.number('bare'), i.number('overall')),
  enamel_max_overall: (i) => enamel(i.number('bare'), grade(i)).maxOverall,
  conductor_tolerance: (i) => enamel(i.number('bare'), 1).tolerance,
  winding_wire_length: (i) =>
    wireLength({
      turns: i.number('turns'),
      diameter: i.number('diameter'),
      pitch: i.number('pitch'),
      leads: i.number('leads'),
      taps: i.number('taps'),
      tapLoop: i.number('tapLoop'),
    }),
  turns_close_wound: (i) => closeTurns(i.number('length'), i.number('overall'), i.number('layFactor')),
  winding_length: (i) => i.number('turns') * i.number('wireOverall') * i.number('layFactor'),
  skin_depth: (i) => skinOf(i).delta,
  skin_ratio: (i) => skinOf(i).f,
  proximity_function: (i) => skinOf(i).x,
  medhurst_phi: (i) => phi(i.number('lengthOverDiameter'), i.number('pitchOverWire')),
  medhurst_h: (i) => medhurstH(i.number('lengthOverDiameter'), i.number('erInside')),
  coil_ac_resistance: (i) =>
    coilResistance({
      turns: i.number('turns'),
      diameter: i.number('diameter'),
      pitch: i.number('pitch'),
      wireBare: i.number('wireBare'),
      ...warm(i),
    }),
  litz_ac_resistance: (i) =>
    litzResistance({
      turns: i.number('turns'),
      diameter: i.number('diameter'),
      pitch: i.number('pitch'),
      strandBare: i.number('strandBare'),
      strands: i.number('strands'),
      bundleDiameter: i.number('bundleDiameter'),
      layFactor: i.number('layFactor'),
      ...warm(i),
    }),
  coil_q_total: (i) => totalQ(i.number('qCopper'), i.number('qDielectric'), i.number('qCapacitor')),
  coil_self_capacitance: (i) => selfCapacitance(i.number('length'), i.number('diameter'), i.number('erInside')),
  self_resonance: (i) => resonance(i.number('inductance'), i.number('selfCapacitance')),
  sensitivity_diameter: (i) => solenoidSensitivity(shape(i), 'diameter'),
  sensitivity_pitch: (i) => solenoidSensitivity(shape(i), 'pitch'),
  sensitivity_turns: (i) => solenoidSensitivity(shape(i), 'turns'),
  turns_for_inductance: (i) => turnsFor(wanted(i)).turns,
  turns_for_inductance_achieved: (i) => turnsFor(wanted(i)).inductance,
  tap_turns_for_ratio: (i) => tapFor({ ...shape(i), voltageRatio: i.number('voltageRatio') }).turns,
};
