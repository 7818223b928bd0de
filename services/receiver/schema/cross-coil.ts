import { enamel } from '../coils/wire';
import { rodFormula } from '../coils/rod';
import { keyed, listed, numberOf, type Reader } from './reading';

interface WireFound {
  bare: number;
  overall: number;
}

/** Overall diameter where none is given: grade 1, or 1.28 root n strands of it. */
export function defaultOverall(bare: number, strands: number): number {
  const { nominal } = enamel(bare, 1);
  return strands > 1 ? 1.28 * Math.sqrt(strands) * nominal : nominal;
}

function wireIssues({ say }: Reader, path: string, wire: Record<string, unknown>, diameter: number): WireFound {
  const bare = numberOf(wire['bare']);
  const strands = typeof wire['strands'] === 'number' ? wire['strands'] : 1;
  if (!(bare > 0)) return { bare: NaN, overall: NaN };
  const given = wire['overall'] !== undefined;
  const overall = given ? numberOf(wire['overall']) : defaultOverall(bare, strands);
  const field = given ? `${path}.overall` : `${path}.bare`;
  if (overall < bare) say(field, 'Give an overall diameter of at least the bare one: the two may be exchanged.');
  if (strands <= 1 && overall > bare + 0.5e-3)
    say(field, 'Give an overall diameter at most 0.5 mm above the bare one.');
  if (overall > 5e-3) say(field, 'Give a bundle of at most 5 mm.');
  if (bare > diameter / 5) say(`${path}.bare`, 'Give a wire of at most a fifth of the winding diameter.');
  return { bare, overall };
}

/** Coil geometry within section 0 of the coil reference, taps, and the form of a measured coil. */
export function coilIssues(reader: Reader): void {
  const coil = keyed(reader.root['coil']);
  if (coil['kind'] === 'measured') measuredIssues(reader, coil);
  if (coil['kind'] === 'solenoid') solenoidIssues(reader, coil);
  if (coil['kind'] === 'spiral') spiralIssues(reader, coil);
  if (coil['kind'] === 'multilayer') multilayerIssues(reader, coil);
  if (coil['kind'] === 'rod') rodIssues(reader, coil);
}

function tapIssues({ say }: Reader, coil: Record<string, unknown>, turns: number, step = 1): void {
  const taps = keyed(coil['taps']);
  for (const key of ['aerial', 'detector']) {
    const tap = numberOf(taps[key]);
    if (tap >= turns) say(`coil.taps.${key}`, 'Give a tap below the end of the coil.');
    else if (tap % step !== 0 && tap > 0)
      say(`coil.taps.${key}`, 'Give a tap between two layers: a multiple of the turns a layer.');
  }
}

function measuredIssues(reader: Reader, coil: Record<string, unknown>): void {
  const { root, say } = reader;
  const variable = keyed(root['tuning'])['kind'] === 'inductance';
  if (coil['q'] === undefined && coil['r'] === undefined) say('coil.q', 'Give a Q or a series resistance.');
  if (coil['q'] !== undefined && coil['r'] !== undefined)
    say('coil.r', 'Give either a Q or a series resistance, not both.');
  if (variable) return;
  if (coil['l'] === undefined && coil['sections'] === undefined) say('coil.l', 'Give the inductance or the sections.');
  if (coil['l'] !== undefined && coil['sections'] !== undefined)
    say('coil.l', 'Give either an inductance or sections, not both.');
  const rows = listed(coil['sections']);
  const size = coil['sections'] === undefined ? 1 : rows.length;
  if (coil['taps'] !== undefined) tapIssues(reader, coil, size);
  if (rows.length === 0) return;
  const m = (i: number, j: number): number => numberOf(listed(rows[i])[j]);
  let sound = true;
  rows.forEach((row, i) => {
    if (listed(row).length !== size) {
      say(`coil.sections.${i}`, 'Give as many entries as there are sections.');
      sound = false;
    }
  });
  if (!sound) return;
  for (let i = 0; i < size; i += 1) {
    if (m(i, i) <= 0) say(`coil.sections.${i}.${i}`, 'Give a self-inductance above zero.');
    for (let j = 0; j < i; j += 1) {
      if (m(i, j) !== m(j, i))
        say(`coil.sections.${i}.${j}`, 'Give the same mutual inductance as in the mirrored place.');
    }
  }
  if (!positiveDefinite(size, m))
    say('coil.sections', 'The mutual inductances are too large for the sections: check them.');
}

/** Leading minors above zero; a NaN entry is somebody else's issue and passes. */
export function positiveDefinite(size: number, m: (i: number, j: number) => number): boolean {
  if (m(0, 0) <= 0) return false;
  if (size >= 2 && m(0, 0) * m(1, 1) - m(0, 1) * m(1, 0) <= 0) return false;
  if (size < 3) return true;
  const determinant =
    m(0, 0) * (m(1, 1) * m(2, 2) - m(1, 2) * m(2, 1)) -
    m(0, 1) * (m(1, 0) * m(2, 2) - m(1, 2) * m(2, 0)) +
    m(0, 2) * (m(1, 0) * m(2, 1) - m(1, 1) * m(2, 0));
  return !(determinant <= 0);
}

function solenoidIssues(reader: Reader, coil: Record<string, unknown>): void {
  const turns = numberOf(coil['turns']);
  const former = numberOf(coil['formerDiameter']);
  const { overall } = wireIssues(reader, 'coil.wire', keyed(coil['wire']), former);
  const diameter = former + overall;
  const pitch = coil['pitch'] === undefined ? 1.03 * overall : numberOf(coil['pitch']);
  const field = coil['pitch'] === undefined ? 'coil.wire.overall' : 'coil.pitch';
  if (pitch < overall * (1 - 1e-9))
    reader.say(field, 'Give a pitch of at least the overall diameter: turns would overlap.');
  if (pitch > diameter / 3) reader.say(field, 'Give a pitch of at most a third of the winding diameter.');
  const ratio = (turns * pitch) / diameter;
  if (ratio < 0.02 || ratio > 20)
    reader.say('coil.turns', 'Give a winding whose length is 0.02 to 20 of its diameter.');
  tapIssues(reader, coil, turns);
}

function spiralIssues(reader: Reader, coil: Record<string, unknown>): void {
  const turns = numberOf(coil['turns']);
  const inner = numberOf(coil['innerDiameter']);
  const pitch = numberOf(coil['pitch']);
  const { overall } = wireIssues(reader, 'coil.wire', keyed(coil['wire']), inner + turns * pitch);
  if (pitch < overall * (1 - 1e-9))
    reader.say('coil.pitch', 'Give a pitch of at least the overall diameter: turns would overlap.');
  if (inner <= 2 * pitch) reader.say('coil.innerDiameter', 'Give an inner diameter above two pitches.');
  if (inner + 2 * turns * pitch > 0.6) reader.say('coil.turns', 'Give a spiral of at most 0.6 m outside.');
  tapIssues(reader, coil, turns);
}

function multilayerIssues(reader: Reader, coil: Record<string, unknown>): void {
  const layers = numberOf(coil['layers']);
  const each = numberOf(coil['turnsPerLayer']);
  const inner = numberOf(coil['innerDiameter']);
  const { overall } = wireIssues(reader, 'coil.wire', keyed(coil['wire']), inner);
  if (layers * each > 3000) reader.say('coil.turnsPerLayer', 'Give at most 3000 turns in all.');
  if (numberOf(coil['length']) / each < overall * (1 - 1e-9))
    reader.say('coil.length', 'Give a longer winding: turns would overlap.');
  if (numberOf(coil['layerPitch']) < overall * (1 - 1e-9))
    reader.say('coil.layerPitch', 'Give a layer pitch of at least the overall diameter.');
  tapIssues(reader, coil, layers * each, each);
}

function rodIssues(reader: Reader, coil: Record<string, unknown>): void {
  const { say } = reader;
  const length = numberOf(coil['rodLength']);
  const diameter = numberOf(coil['rodDiameter']);
  const wound = numberOf(coil['coilLength']);
  const turns = numberOf(coil['turns']);
  const offset = coil['offset'] === undefined ? 0 : numberOf(coil['offset']);
  const measured = coil['al'] !== undefined;
  wireIssues(reader, 'coil.wire', keyed(coil['wire']), diameter);
  const slim = length / diameter;
  if (measured ? slim < 2 || slim > 50 : slim < 5 || slim > 20) {
    say('coil.rodLength', 'Give a rod of 5 to 20 diameters, or a measured inductance for one turn.');
  }
  const share = wound / length;
  if (share < 0.1 || share > 0.9) say('coil.coilLength', 'Give a coil of a tenth to nine tenths of the rod.');
  if (Math.abs(offset) + wound / 2 > length / 2) say('coil.offset', 'The coil reaches beyond the rod: move it inward.');
  tapIssues(reader, coil, turns);
  const shape = { rodLength: length, rodDiameter: diameter, muInitial: numberOf(coil['muInitial']) };
  const taps = keyed(coil['taps']);
  for (const key of ['aerial', 'detector']) {
    const tap = numberOf(taps[key]);
    if (!(tap > 0 && tap < turns)) continue;
    const part = tap / turns;
    if (Math.min(part, 1 - part) * share < 0.05) {
      say(`coil.taps.${key}`, 'Give a tap whose sections are at least a twentieth of the rod long.');
      continue;
    }
    const whole = rodFormula({ ...shape, turns, coilLength: wound, offset });
    const lower = rodFormula({
      ...shape,
      turns: tap,
      coilLength: wound * part,
      offset: offset - (wound * (1 - part)) / 2,
    });
    const upper = rodFormula({
      ...shape,
      turns: turns - tap,
      coilLength: wound * (1 - part),
      offset: offset + (wound * part) / 2,
    });
    const k = (whole - lower - upper) / (2 * Math.sqrt(lower * upper));
    if (k < 0.2 || k > 0.98)
      say(`coil.taps.${key}`, 'The sections of this rod coil come out with an impossible coupling: check the rod.');
  }
}

/** The two forms of a coupled primary: measured, or wound on a solenoid. */
export function primaryIssues(reader: Reader): void {
  const { root, say } = reader;
  const primary = keyed(root['coupling']);
  if (primary['kind'] !== 'primary') return;
  const measured = ['l', 'r', 'k'];
  const wound = ['turns', 'diameter', 'gap', 'wire'];
  const byGeometry = [...wound, 'pitch'].some((key) => primary[key] !== undefined);
  for (const key of byGeometry ? wound : measured) {
    if (primary[key] === undefined) say(`coupling.${key}`, 'This value of the primary is missing.');
  }
  if (!byGeometry) return;
  for (const key of measured) {
    if (primary[key] !== undefined) say(`coupling.${key}`, 'Give either l, r and k, or the winding, not both.');
  }
  const coil = keyed(root['coil']);
  if (coil['kind'] !== 'solenoid' && coil['kind'] !== undefined)
    say('coupling.turns', 'A primary by its winding needs a solenoid: give l, r and k.');
  const diameter = numberOf(primary['diameter']);
  const { overall } = wireIssues(reader, 'coupling.wire', keyed(primary['wire']), diameter);
  const pitch = primary['pitch'] === undefined ? 1.03 * overall : numberOf(primary['pitch']);
  if (pitch < overall * (1 - 1e-9))
    say('coupling.pitch', 'Give a pitch of at least the overall diameter: turns would overlap.');
  if (pitch > diameter / 3) say('coupling.pitch', 'Give a pitch of at most a third of the winding diameter.');
  if (numberOf(primary['turns']) > numberOf(coil['turns']))
    say('coupling.turns', 'Give a primary of at most the turns of the coil.');
  const ratio = (numberOf(primary['turns']) * pitch) / diameter;
  if (ratio > 20) say('coupling.turns', 'Give a shorter primary.');
}
