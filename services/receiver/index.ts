export { asText } from './as-text';
export { BANDS, bandOf, carrierCount, nearestCarrier, nthCarrier, type BandEntry } from './bands';
export { dialLabels, labelsThatFit, type DialMark, type DialRoom } from './capacitors/dial';
export { gang, type Gang, type GangLaw, type GangShape } from './capacitors/gang';
export { coilResistance, directResistance, totalQ } from './coils/loss';
export { sections, solenoid, type SolenoidShape } from './coils/solenoid';
export { selfCapacitance } from './coils/self-capacitance';
export { tapFor, turnsFor } from './coils/turns-for';
export {
  awgDiameter,
  closeTurns,
  copper,
  enamel,
  wireLength,
  wireMass,
  wireResistance,
  type Enamel,
  type WireNeed,
} from './coils/wire';
export { contour, type Contour, type ContourOptions } from './coverage/contour';
export { responseCurves } from './curves';
export { Design, type DesignInput } from './design';
export { dialMarks, type DialSize } from './dial';
export { CLASS_VALUES, DETECTOR_CLASSES, type DetectorClass } from './detector/diode';
export { DEFAULT_BOXES, DEFAULT_SEED, evaluate, type EvaluateOptions } from './evaluate';
export { InvalidInput, type Issue } from './invalid-input';
export { canonicalJson, sha256 } from './numeric/digest';
export { Rules, rules as defaultRules } from './rules';
export { centre, type Spread, type Value } from './schema/value';
export { applyChanges } from './seek/changes';
export { AERIAL_TAP, FIRST_CAPACITOR, type Choice, type SeekAsk, type StockLists, type StockPart } from './seek/ask';
export { nearestFix, type Fix, type FixOptions } from './seek/nearest-fix';
export { seek, type SeekCursor, type SeekProgress, type SeekResult, type Seeker } from './seek/seek';
export { Finding, Verdict, type Change, type Point, type Severity } from './verdict';
export { ENGINE_VERSION } from './version';
