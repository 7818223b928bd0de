import type { DesignInput } from '../receiver';
import type { PartKind, PartValue, Place, ValuesOf } from '../parts/schemas';
import type { Circuit, VersionContent } from './schemas';

/** The line's part when it is of this kind. */
export function valuesAt<K extends PartKind>(
  content: Pick<VersionContent, 'lines'>,
  place: Place,
  kind: K,
): ValuesOf<K> | null {
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
  const tuning =
    valuesAt(content, 'tuning capacitor', 'variable-capacitor') ??
    valuesAt(content, 'tuning capacitor', 'foil-capacitor');
  const coupling = valuesAt(content, 'coupling capacitor', 'fixed-capacitor');
  const detector = valuesAt(content, 'detector', 'detector');
  const earphone = valuesAt(content, 'earphone', 'earphone');
  const aerial = valuesAt(content, 'aerial', 'aerial-wire');

  const lacks: string[] = [];
  if (!former) lacks.push('Choose a coil former.');
  if (!wire) lacks.push('Choose the wire of the coil.');
  if (!tuning) lacks.push('Choose a tuning capacitor.');
  if (circuit.coupling === 'series-c' && !coupling) lacks.push('Choose the coupling capacitor, or another coupling.');
  if (circuit.coupling === 'aerial-tap' && circuit.winding.aerialTap === null)
    lacks.push('Say at which turn the aerial tap is.');
  if (circuit.detectorAt === 'tap' && circuit.winding.detectorTap === null)
    lacks.push('Say at which turn the detector tap is.');
  if (!detector) lacks.push('Choose a detector.');
  if (!earphone) lacks.push('Choose an earphone.');
  if (!aerial) lacks.push('Choose the aerial wire.');
  if (!former || !wire || !tuning || !detector || !earphone || !aerial || lacks.length > 0)
    return { design: null, lacks };

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
      // The winding's tolerance covers the former's (coils-and-capacitors, J), so that it does not count twice.
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
