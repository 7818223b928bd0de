import type { Design } from '../design';
import { centre } from '../schema/value';
import { THERMAL_VOLT, type Farad, type Ohm, type Volt } from '../units';
import { CLASS_VALUES, diode, forwardVoltage, saturationCurrent, zeroBiasResistance, type Diode } from './diode';

/** The detector of a design with its class's values filled in. */
export interface DetectorFacts {
  diode: Diode;
  rs: Ohm;
  cj: Farad;
  /** A natural or improvised contact. */
  contact: boolean;
  measured: boolean;
  /** Forward voltage at 1 mA as a tester showed it; null if none was given. */
  reading: Volt | null;
  zeroBiasR: Ohm;
  vf1mA: Volt;
}

/** Current of the forward reading, ampere. */
const READING = 1e-3;

export function detectorFacts({ detector, temperature }: Design): DetectorFacts {
  const kelvin = centre(temperature);
  const values = detector.class === undefined ? null : CLASS_VALUES[detector.class];
  const n = centre(detector.n ?? values?.n ?? NaN);
  const rs = centre(detector.rs ?? values?.rs ?? 0);
  const reading = detector.vf1mA === undefined ? null : centre(detector.vf1mA);
  let is = centre(detector.is ?? values?.is ?? NaN);
  if (reading !== null && detector.is === undefined)
    is = saturationCurrent(reading, READING, n * THERMAL_VOLT * kelvin, rs);
  const d = diode(is, n, kelvin);
  return {
    diode: d,
    rs,
    cj: centre(detector.cj ?? values?.cj ?? 0),
    contact: values?.contact ?? false,
    measured: detector.measured,
    reading,
    zeroBiasR: zeroBiasResistance(d),
    vf1mA: forwardVoltage(d, READING, rs),
  };
}

/** The detector others are compared with, at the design's temperature. */
export function germanium({ temperature }: Design): Diode {
  return diode(CLASS_VALUES.germanium.is, CLASS_VALUES.germanium.n, centre(temperature));
}
