import { type DesignInput, type Verdict, enamel, wireLength } from '../receiver';
import type { ValuesOf, PartKind, PartValue, Place } from '../parts/schemas';
import { CautionCode, type Circuit, type FrozenLine, type VersionContent, type VersionState } from './schemas';

export type Finding = Verdict['findings'][number];

/** Letters of versions leave out I, O, Q, S, X and Z (ASME Y14.35); after Y comes AA. */
const letters = 'ABCDEFGHJKLMNPRTUVWY';

export function letterAfter(letter: string | null): string {
  if (!letter) return 'A';
  const last = letters.indexOf(letter.slice(-1));
  const rest = letter.slice(0, -1);
  if (last < letters.length - 1) return rest + letters.charAt(last + 1);
  return letterAfter(rest || null) + 'A';
}

/** Which state may follow which. A held version is answered by a new one, a released one can only be withdrawn. */
const moves: Record<VersionState, readonly VersionState[]> = {
  draft: ['in-check'],
  'in-check': ['draft', 'held', 'released'],
  held: [],
  released: ['withdrawn'],
  withdrawn: [],
};

export const mayBecome = (from: VersionState, to: VersionState) => moves[from].includes(to);

/** Millimetres, milligrams or pieces of a line times the part's mass a metre, a gram or a piece. */
export function lineMass(line: Pick<FrozenLine, 'quantity' | 'part'>): number {
  if (!line.part) return 0;
  const perThousand = line.part.unit === 'metre' || line.part.unit === 'gram';
  return perThousand
    ? Math.round((line.quantity * line.part.massMilligrams) / 1000)
    : line.quantity * line.part.massMilligrams;
}

export const contentMass = (content: Pick<VersionContent, 'lines'>) =>
  content.lines.reduce((sum, line) => sum + lineMass(line), 0);

/** The line's part when it is of this kind. */
export function valuesAt<K extends PartKind>(content: Pick<VersionContent, 'lines'>, place: Place, kind: K): ValuesOf<K> | null {
  const line = content.lines.find((one) => one.place === place && one.part?.values.kind === kind);
  // Extract<> over a checked discriminant; TypeScript cannot follow it through a generic.
  return (line?.part?.values as ValuesOf<K> | undefined) ?? null;
}

/** A part's value as the engine reads it: a number, or its spread written out. */
const spread = (value: Pick<PartValue, 'nominal' | 'tol' | 'dist'>) =>
  value.tol === undefined
    ? value.nominal
    : { nominal: value.nominal, tol: value.tol, ...(value.dist && { dist: value.dist }) };

export type DesignOutcome = { design: DesignInput; lacks: [] } | { design: null; lacks: string[] };

/** The design file of a version, or what it still lacks, a sentence each. */
export function designOf(content: Pick<VersionContent, 'kit' | 'circuit' | 'lines' | 'letter'>): DesignOutcome {
  const { circuit } = content;
  const former = valuesAt(content, 'tuning coil', 'coil-former');
  const wire = valuesAt(content, 'tuning coil', 'wire');
  const tuning = valuesAt(content, 'tuning capacitor', 'variable-capacitor') ?? valuesAt(content, 'tuning capacitor', 'foil-capacitor');
  const coupling = valuesAt(content, 'coupling capacitor', 'fixed-capacitor');
  const detector = valuesAt(content, 'detector', 'detector');
  const earphone = valuesAt(content, 'earphone', 'earphone');
  const aerial = valuesAt(content, 'aerial', 'aerial-wire');

  const lacks: string[] = [];
  if (!former) lacks.push('Choose a coil former.');
  if (!wire) lacks.push('Choose the wire of the coil.');
  if (!tuning) lacks.push('Choose a tuning capacitor.');
  if (circuit.coupling === 'series-c' && !coupling) lacks.push('Choose the coupling capacitor, or another coupling.');
  if (circuit.coupling === 'aerial-tap' && circuit.winding.aerialTap === null) lacks.push('Say at which turn the aerial tap is.');
  if (circuit.detectorAt === 'tap' && circuit.winding.detectorTap === null) lacks.push('Say at which turn the detector tap is.');
  if (!detector) lacks.push('Choose a detector.');
  if (!earphone) lacks.push('Choose an earphone.');
  if (!aerial) lacks.push('Choose the aerial wire.');
  if (!former || !wire || !tuning || !detector || !earphone || !aerial || lacks.length > 0) return { design: null, lacks };

  const { code: _code, ...band } = content.kit.band;
  const taps = tapsOf(circuit);
  const transformer = valuesAt(content, 'transformer', 'transformer');
  const returnResistor = valuesAt(content, 'return resistor', 'resistor');
  const bypass = valuesAt(content, 'bypass capacitor', 'fixed-capacitor');
  const design: DesignInput = {
    format: 'coilyard-design/1',
    name: `${content.kit.name} ${content.kit.number} ${content.letter}`,
    band,
    aerial: {
      kind: 'wire',
      vertical: circuit.aerial.vertical,
      horizontal: circuit.aerial.horizontal,
      radius: aerial.radius,
      siteFactor: spread(circuit.aerial.siteFactor),
    },
    earth: circuit.earth.kind === 'none' ? { kind: 'none' } : { kind: 'resistance', r: spread(circuit.earth.r) },
    coupling:
      circuit.coupling === 'series-c' && coupling
        ? { kind: 'series-c', c: spread(coupling.c) }
        : circuit.coupling === 'aerial-tap'
          ? { kind: 'aerial-tap' }
          : { kind: 'direct' },
    detectorAt: circuit.detectorAt,
    coil: {
      kind: 'solenoid',
      turns: circuit.winding.turns,
      formerDiameter: former.outerDiameter.nominal,
      formerLength: former.length,
      former: former.wall,
      wire: { bare: wire.bare, overall: wire.overall },
      ...(circuit.winding.pitch !== null && { pitch: circuit.winding.pitch }),
      ...(taps && { taps }),
      lFactor: { nominal: 1, tol: circuit.winding.tolerance, dist: 'normal' },
    },
    tuning:
      tuning.kind === 'variable-capacitor'
        ? {
            kind: 'capacitor',
            min: spread(tuning.min),
            max: spread(tuning.max),
            law: tuning.law,
            turn: (tuning.turnDegrees * 3.141592653589793) / 180,
          }
        : {
            kind: 'foil',
            form: 'plates',
            width: tuning.width,
            travel: tuning.travel,
            layers: [[spread(tuning.sheetThickness), tuning.sheetPermittivity]],
            faces: tuning.faces,
            min: spread(tuning.min),
          },
    stray: spread(circuit.stray),
    detector: {
      class: detector.detectorClass,
      ...(detector.saturationCurrent && { is: spread(detector.saturationCurrent) }),
      ...(detector.idealityFactor && { n: spread(detector.idealityFactor) }),
      ...(detector.seriesResistance && { rs: spread(detector.seriesResistance) }),
      ...(detector.junctionCapacitance && { cj: spread(detector.junctionCapacitance) }),
      ...(detector.forwardVoltageAt1mA && { vf1mA: spread(detector.forwardVoltageAt1mA) }),
      measured: detector.measured,
    },
    earphone:
      earphone.earphoneKind === 'ceramic'
        ? {
            kind: 'ceramic',
            c: spread(earphone.c),
            rDc: spread(earphone.rDc),
            ...(earphone.threshold !== undefined && { threshold: earphone.threshold }),
          }
        : {
            kind: earphone.earphoneKind,
            rDc: spread(earphone.rDc),
            r: spread(earphone.r),
            x: earphone.x,
            ...(earphone.threshold !== undefined && { threshold: earphone.threshold }),
          },
    ...(transformer && {
      transformer: {
        ratio: transformer.ratio,
        primaryR: spread(transformer.primaryR),
        ...(transformer.primaryL !== undefined && { primaryL: transformer.primaryL }),
        loss: transformer.lossDb,
      },
    }),
    ...(returnResistor && { returnResistor: spread(returnResistor.r) }),
    ...(bypass && { bypass: spread(bypass.c) }),
    place: circuit.place,
  };
  return { design, lacks: [] };
}

function tapsOf({ winding, coupling, detectorAt }: Circuit) {
  const taps = {
    ...(coupling === 'aerial-tap' && winding.aerialTap !== null && { aerial: winding.aerialTap }),
    ...(detectorAt === 'tap' && winding.detectorTap !== null && { detector: winding.detectorTap }),
  };
  return Object.keys(taps).length > 0 ? taps : null;
}

/** Findings that need the rest of the version: guide, cautions, wire and aerial in the box (receiver.md H). */
export function versionFindings(content: VersionContent): Finding[] {
  return [guideMiss(content), wireShort(content), aerialShort(content)].filter((finding) => finding !== null);
}

function guideMiss({ guide, lines }: VersionContent): Finding | null {
  const lacks: string[] = [];
  if (guide.intro === '') lacks.push('an introduction');
  if (guide.steps.length === 0) lacks.push('its steps');
  for (const code of CautionCode.options) if (!guide.cautions.includes(code)) lacks.push(`the caution "${code}"`);
  const used = new Set(guide.steps.flatMap((step) => step.uses));
  const unused = lines.filter((line) => isBuiltIn(line) && !used.has(line.reference)).map((line) => line.reference);
  if (unused.length > 0) lacks.push(`a step that uses ${unused.join(', ')}`);
  if (lacks.length === 0) return null;
  return {
    code: 'GUIDE-MISS',
    severity: 'stop',
    path: 'guide',
    value: lacks.length,
    limit: 0,
    unit: '1',
    message: `The guide lacks ${lacks.join('; ')}.`,
    remedy: { text: 'Write what is missing.', changes: [] },
  };
}

/** Lines a builder fits into the set, so that a step of the guide has to name them. */
const isBuiltIn = (line: FrozenLine) => !['tool', 'print', 'packaging'].includes(line.place);

function wireShort(content: VersionContent): Finding | null {
  const former = valuesAt(content, 'tuning coil', 'coil-former');
  const line = content.lines.find((one) => one.place === 'tuning coil' && one.part?.values.kind === 'wire');
  const wire = valuesAt(content, 'tuning coil', 'wire');
  if (!former || !wire || !line) return null;
  const { winding } = content.circuit;
  const overall = wire.overall || enamel(wire.bare, 1).nominal;
  const taps = [winding.aerialTap, winding.detectorTap].filter((tap) => tap !== null).length;
  const needed = wireLength({
    turns: winding.turns,
    diameter: former.outerDiameter.nominal + overall,
    pitch: winding.pitch ?? 1.03 * overall,
    taps,
  });
  const given = line.quantity / 1000;
  if (given >= needed) return null;
  const cut = Math.ceil(needed * 1.03 * 10) / 10;
  return {
    code: 'WIRE-SHORT',
    severity: 'stop',
    path: `lines.${line.reference}.quantity`,
    value: given,
    limit: needed,
    unit: 'm',
    message: `The winding needs ${needed.toFixed(2)} m, the line gives ${given.toFixed(2)} m.`,
    remedy: {
      text: `Cut ${cut.toFixed(1)} m for the coil.`,
      changes: [{ path: `lines.${line.reference}.quantity`, from: line.quantity, to: Math.round(cut * 1000) }],
    },
  };
}

function aerialShort(content: VersionContent): Finding | null {
  const aerial = valuesAt(content, 'aerial', 'aerial-wire');
  if (!aerial) return null;
  const assumed = content.circuit.aerial.vertical + content.circuit.aerial.horizontal;
  if (aerial.length >= assumed) return null;
  return {
    code: 'AERIAL-SHORT',
    severity: 'note',
    path: 'aerial',
    value: aerial.length,
    limit: assumed,
    unit: 'm',
    message: `The design assumes ${assumed} m of aerial, the box holds ${aerial.length} m.`,
    remedy: { text: 'Choose a longer wire, or assume a shorter aerial.', changes: [] },
  };
}

const rank: Record<Finding['severity'], number> = { stop: 0, note: 1, info: 2 };

/** The engine's findings and the version's own, stops first. */
export function allFindings(verdict: Verdict, content: VersionContent): Finding[] {
  return [...verdict.findings, ...versionFindings(content)].sort((a, b) => rank[a.severity] - rank[b.severity]);
}

export const stopsIn = (findings: readonly Finding[]) => findings.filter((finding) => finding.severity === 'stop');
export const notesIn = (findings: readonly Finding[]) => findings.filter((finding) => finding.severity === 'note');

/** Names a finding in a checker's reasons: its code and where it points. */
export const findingKey = (finding: Pick<Finding, 'code' | 'path'>) => `${finding.code} ${finding.path}`;

/** What every box of a version needs from the store, by part code; prints are made, not picked. */
export function partsOfBox(content: Pick<VersionContent, 'lines'>): Map<string, number> {
  const needed = new Map<string, number>();
  for (const { part, quantity } of content.lines) {
    if (part && part.values.kind !== 'print') needed.set(part.code, (needed.get(part.code) ?? 0) + quantity);
  }
  return needed;
}
