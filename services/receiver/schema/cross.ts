import { CLASS_VALUES, DETECTOR_CLASSES } from '../detector/diode';
import { wireCapacitance } from '../aerial/wire';
import { EPSILON_0, LIGHT_SPEED, TWO_PI } from '../units';
import type { Issue } from '../invalid-input';
import { coilIssues, primaryIssues } from './cross-coil';
import { keyed, listed, numberOf, type Reader } from './reading';

/**
 * The rules that tie two keys of a design together. Reads a design that may be wrong elsewhere: whatever is missing or of
 * the wrong kind is passed over here, since its own issue names it.
 */
export function crossIssues(design: unknown): Issue[] {
  const issues: Issue[] = [];
  const reader: Reader = { root: keyed(design), say: (path, message) => issues.push({ path, message }) };
  bandIssues(reader);
  aerialIssues(reader);
  couplingIssues(reader);
  tuningIssues(reader);
  coilIssues(reader);
  primaryIssues(reader);
  detectorIssues(reader);
  return issues;
}

function bandIssues({ root, say }: Reader): void {
  const band = keyed(root['band']);
  const [lo, hi] = [numberOf(band['lo']), numberOf(band['hi'])];
  const [first, last] = [numberOf(band['firstCarrier']), numberOf(band['lastCarrier'])];
  if (lo >= hi) say('band.hi', 'Give an upper edge above the lower one.');
  if (hi / lo > 12) say('band.hi', 'Give at most twelve times the lower edge: no single tuning element spans more.');
  if (first < lo) say('band.firstCarrier', 'Give a first carrier inside the band.');
  if (last < first) say('band.lastCarrier', 'Give a last carrier at or above the first.');
  if (last > hi) say('band.lastCarrier', 'Give a last carrier inside the band.');
}

function aerialIssues({ root, say }: Reader): void {
  const aerial = keyed(root['aerial']);
  if (aerial['kind'] !== 'wire') return;
  const [vertical, horizontal] = [numberOf(aerial['vertical']), numberOf(aerial['horizontal'])];
  const radius = numberOf(aerial['radius']);
  if (radius > vertical / 10 || (horizontal > 0 && radius > horizontal / 10)) {
    say('aerial.radius', 'Give a radius of at most a tenth of each length.');
    return;
  }
  const angle = (TWO_PI * numberOf(keyed(root['band'])['hi']) * (vertical + horizontal)) / LIGHT_SPEED;
  if (angle > 2.2)
    say('aerial.horizontal', 'The wire is too long for the top of the band: shorten it below 0.35 wavelengths.');
  else if (!(wireCapacitance(vertical, horizontal, radius) > 0) && vertical > 0 && horizontal >= 0 && radius > 0) {
    say('aerial.radius', 'Give a thinner wire: this one has no capacitance in the model.');
  }
}

function couplingIssues({ root, say }: Reader): void {
  const coil = keyed(root['coil']);
  const taps = keyed(coil['taps']);
  const coupling = keyed(root['coupling'])['kind'];
  const wantsAerial = coupling === 'aerial-tap';
  const wantsDetector = root['detectorAt'] === 'tap';
  if (keyed(root['tuning'])['kind'] === 'slider' || keyed(root['tuning'])['kind'] === 'inductance') {
    if (wantsAerial) say('coupling.kind', 'A coil tuned by its inductance has no tap: couple the aerial another way.');
    if (wantsDetector) say('detectorAt', 'A coil tuned by its inductance has no tap: put the detector at the top.');
    return;
  }
  if (wantsAerial && taps['aerial'] === undefined)
    say('coil.taps.aerial', 'Give the tap of the aerial: the coupling asks for it.');
  if (wantsDetector && taps['detector'] === undefined)
    say('coil.taps.detector', 'Give the tap of the detector: detectorAt asks for it.');
}

function gangIssues({ say }: Reader, path: string, gang: Record<string, unknown>): void {
  if (gang['kind'] === 'capacitor' && numberOf(gang['min']) >= numberOf(gang['max'])) {
    say(`${path}.max`, 'Give a largest capacitance above the smallest.');
  }
  if (gang['kind'] !== 'foil') return;
  let gap = 0;
  for (const layer of listed(gang['layers'])) gap += numberOf(listed(layer)[0]) / numberOf(listed(layer)[1]);
  const travel = numberOf(gang['travel']);
  const area =
    gang['form'] === 'sleeve'
      ? TWO_PI * numberOf(gang['innerRadius']) * travel
      : numberOf(gang['width']) * travel * numberOf(gang['faces']);
  const full = (EPSILON_0 * area) / gap;
  if (full > 10e-9) say(`${path}.layers`, 'These foils make more than 10 nF: take a smaller area or a thicker sheet.');
  if (full < 0.1e-12)
    say(`${path}.layers`, 'These foils make less than 0.1 pF: take a larger area or a thinner sheet.');
}

function tuningIssues(reader: Reader): void {
  const { root, say } = reader;
  const tuning = keyed(root['tuning']);
  const coil = keyed(root['coil']);
  gangIssues(reader, 'tuning', tuning);
  if (tuning['kind'] === 'inductance') {
    if (numberOf(tuning['min']) >= numberOf(tuning['max']))
      say('tuning.max', 'Give a largest inductance above the smallest.');
    if (coil['kind'] !== 'measured' && coil['kind'] !== undefined)
      say('coil.kind', 'Tuning by a variable inductance needs a measured coil.');
    for (const key of ['l', 'sections', 'taps']) {
      if (coil[key] !== undefined) say(`coil.${key}`, 'The tuning gives the inductance here: take this key out.');
    }
  }
  if (tuning['kind'] !== 'slider') return;
  gangIssues(reader, 'tuning.c', keyed(tuning['c']));
  const [least, most] = [numberOf(tuning['minTurns']), numberOf(tuning['maxTurns'])];
  if (least >= most) say('tuning.maxTurns', 'Give more turns than the fewest.');
  if (coil['kind'] !== 'solenoid' && coil['kind'] !== undefined)
    say('coil.kind', 'A slider runs along a solenoid: give one.');
  if (most > numberOf(coil['turns'])) say('tuning.maxTurns', 'Give at most the turns of the coil.');
  if (coil['taps'] !== undefined) say('coil.taps', 'A coil with a slider has no taps: take this key out.');
}

/** Current of the forward reading, ampere. */
const READING = 1e-3;

function detectorIssues({ root, say }: Reader): void {
  const detector = keyed(root['detector']);
  const name = DETECTOR_CLASSES.find((each) => each === detector['class']);
  if (root['detector'] === undefined || (detector['class'] !== undefined && name === undefined)) return;
  const values = name === undefined ? null : CLASS_VALUES[name];
  if (values === null && detector['n'] === undefined) say('detector.n', 'Give the ideality, or a class.');
  if (values === null && detector['is'] === undefined && detector['vf1mA'] === undefined) {
    say('detector.is', 'Give the saturation current, a forward voltage at 1 mA, or a class.');
  }
  if (detector['vf1mA'] === undefined || detector['is'] !== undefined) return;
  const rs = detector['rs'] === undefined ? (values?.rs ?? 0) : numberOf(detector['rs']);
  if (numberOf(detector['vf1mA']) <= READING * rs) {
    say('detector.vf1mA', 'The series resistance alone drops more than this reading: check both.');
  }
}
