import {
  aerialSign,
  arrow,
  capacitorLevel,
  capacitorUpright,
  detectorLevel,
  earphoneUpright,
  earthSign,
  joint,
  labelUnder,
  resistorUpright,
  winding,
  wire,
  type Label,
} from './circuit-symbols';
import { line, words, type Drawing, type Shape } from './shapes';

/** The version's circuit with its references and values; what is null is not fitted. */
export type CircuitView = {
  aerial: string;
  earth: string;
  coupling:
    | { kind: 'direct' }
    | { kind: 'series-c'; label: Label }
    | { kind: 'aerial-tap'; label: string }
    | { kind: 'primary'; label: Label };
  coil: Label;
  tuning:
    | { kind: 'capacitor' | 'foil'; label: Label }
    | { kind: 'inductance'; across: Label }
    | { kind: 'slider'; across: Label | null };
  padder: Label | null;
  trimmer: Label | null;
  detectorAt: 'top' | 'tap';
  detector: Label;
  returnResistor: Label | null;
  bypass: Label | null;
  transformer: Label | null;
  earphone: Label;
};

// Millimetres of paper: 182 is the width of an A4 sheet between its margins.
const WIDTH = 182;
const TOP = 24;
const FOOT = 78;
const AERIAL = 18;
const COIL = 58;
const TUNER = 86;
const TAP = { aerial: 62, detector: 42 };
const LABELS = FOOT + 8;

export function circuitDrawing(view: CircuitView): Drawing {
  const level = view.detectorAt === 'tap' ? TAP.detector : TOP;
  return {
    width: WIDTH,
    height: FOOT + 18,
    title: circuitSentence(view),
    shapes: [
      ...aerialSign(AERIAL, TOP),
      words(AERIAL, 9, view.aerial, { size: 3.6, anchor: 'middle' }),
      ...coupling(view),
      wire(`M${AERIAL} ${FOOT}H${WIDTH - 12}`),
      wire(`M${AERIAL} ${FOOT}v2`),
      ...earthSign(AERIAL, FOOT + 2),
      words(AERIAL, FOOT + 12, view.earth, { size: 3.6, anchor: 'middle' }),
      ...tunedCircuit(view),
      ...detectorBranch(view, level),
      ...loadColumns(view, level),
    ],
  };
}

function coupling({ coupling: kind }: CircuitView): Shape[] {
  switch (kind.kind) {
    case 'direct':
      return [wire(`M${AERIAL} ${TOP}H${COIL}`)];
    case 'series-c':
      return [
        wire(`M${AERIAL} ${TOP}H37M39 ${TOP}H${COIL}`),
        ...capacitorLevel(38, TOP),
        words(38, TOP + 10, kind.label.ref, { size: 3.8, anchor: 'middle', bold: true }),
        words(38, TOP + 15, kind.label.value, { size: 3.6, anchor: 'middle' }),
      ];
    case 'aerial-tap':
      return [
        wire(`M${AERIAL} ${TOP}V${TAP.aerial}H${COIL}`),
        joint(COIL, TAP.aerial),
        words(COIL - 3, TAP.aerial - 1.5, kind.label, { size: 3.6, anchor: 'end' }),
      ];
    case 'primary':
      return [
        wire(`M${AERIAL} ${TOP}H${COIL - 10}V40M${COIL - 10} 64V${FOOT}`),
        ...winding(COIL - 10, 40, 64, { turns: 4, bulge: 'left' }),
        joint(COIL - 10, FOOT),
        ...labelUnder(COIL - 24, 52, kind.label),
      ];
  }
}

function tunedCircuit(view: CircuitView): Shape[] {
  const { tuning } = view;
  const across = 'label' in tuning ? tuning.label : tuning.across;
  const isVariable = 'label' in tuning;
  const shapes: Shape[] = [
    wire(`M${COIL} ${TOP}V28M${COIL} 74V${FOOT}`),
    ...winding(COIL, 28, 74, { turns: 7, bulge: 'right' }),
    joint(COIL, FOOT),
    ...labelUnder(COIL, LABELS, view.coil),
  ];
  if (tuning.kind === 'inductance') shapes.push(...arrow(COIL - 5, 68, COIL + 9, 34));
  if (tuning.kind === 'slider') shapes.push(...arrow(COIL + 16, 50, COIL + 4, 50), wire(`M${COIL + 16} 50V${TOP}`));
  shapes.push(wire(`M${COIL} ${TOP}H${across ? TUNER : COIL + 16}`));
  if (!across) return shapes;
  shapes.push(
    wire(`M${TUNER} ${TOP}V${view.padder ? 33 : 61}${view.padder ? `M${TUNER} 35V61` : ''}M${TUNER} 63V${FOOT}`),
    ...capacitorUpright(TUNER, 62, isVariable ? 'variable' : 'fixed'),
    joint(TUNER, FOOT),
    ...labelUnder(TUNER, LABELS, across),
  );
  if (view.padder) {
    shapes.push(
      ...capacitorUpright(TUNER, 34, 'fixed'),
      words(TUNER - 6, 35.5, `${view.padder.ref}, ${view.padder.value}`, { size: 3.4, anchor: 'end' }),
    );
  }
  if (view.trimmer) {
    shapes.push(
      wire(`M${TUNER} 54H${TUNER + 14}V61M${TUNER + 14} 63V70H${TUNER}`),
      ...capacitorUpright(TUNER + 14, 62, 'trimmer'),
      joint(TUNER, 54),
      joint(TUNER, 70),
      words(TUNER + 7, 75, `${view.trimmer.ref}, ${view.trimmer.value}`, { size: 3.4 }),
    );
  }
  return shapes;
}

const DETECTOR = 104;
const FIRST = 118;

/** From the top of the circuit, or from the coil's tap: there the wire hops over the capacitor's. */
function detectorBranch(view: CircuitView, level: number): Shape[] {
  const hasTuner = 'label' in view.tuning || view.tuning.across !== null;
  const from =
    view.detectorAt === 'top'
      ? `M${hasTuner ? TUNER : COIL + 16} ${TOP}`
      : hasTuner
        ? `M${COIL} ${level}H${TUNER - 2}a2 2 0 0 1 4 0`
        : `M${COIL} ${level}`;
  return [
    wire(`${from}H${DETECTOR - 3.5}M${DETECTOR + 3} ${level}H${FIRST}`),
    joint(COIL, level),
    ...detectorLevel(DETECTOR, level),
    words(DETECTOR, level - 10.5, view.detector.ref, { size: 3.8, anchor: 'middle', bold: true }),
    words(DETECTOR, level - 5.8, view.detector.value, { size: 3.6, anchor: 'middle' }),
  ];
}

/** What the detector works into, left to right: return resistor, bypass, transformer, earphone. */
function loadColumns(view: CircuitView, level: number): Shape[] {
  const { returnResistor, bypass, transformer, earphone } = view;
  const columns = [
    returnResistor && { kind: 'return' as const, label: returnResistor },
    bypass && { kind: 'bypass' as const, label: bypass },
    transformer && { kind: 'transformer' as const, label: transformer },
    { kind: 'earphone' as const, label: earphone },
  ].filter((column) => column !== null);
  const last = WIDTH - 14;
  const step = columns.length > 1 ? (last - (FIRST + 8)) / (columns.length - 1) : 0;
  const middle = (level + FOOT) / 2;
  return columns.flatMap(({ kind, label }, index): Shape[] => {
    const x = columns.length === 1 ? last : FIRST + 8 + step * index;
    const before = index === 0 ? FIRST : FIRST + 8 + step * (index - 1);
    const isPast = transformer !== null && kind === 'earphone';
    const feed = isPast ? wire(`M${before + 6} ${level}H${x}`) : wire(`M${before} ${level}H${x}`);
    const common = [feed, ...labelUnder(x, LABELS, label), joint(x, FOOT)];
    switch (kind) {
      case 'return':
        return [...common, wire(`M${x} ${level}V${FOOT}`), ...resistorUpright(x, middle)];
      case 'bypass':
        return [
          ...common,
          wire(`M${x} ${level}V${middle - 1}M${x} ${middle + 1}V${FOOT}`),
          ...capacitorUpright(x, middle, 'fixed'),
        ];
      case 'transformer':
        return [
          ...common,
          wire(
            `M${x} ${level}V${middle - 10}M${x} ${middle + 10}V${FOOT}M${x + 6} ${level}V${middle - 10}M${x + 6} ${middle + 10}V${FOOT}`,
          ),
          ...winding(x, middle - 10, middle + 10, { turns: 4, bulge: 'right' }),
          ...winding(x + 6, middle - 10, middle + 10, { turns: 4, bulge: 'left' }),
          line(x + 3, middle - 10, x + 3, middle + 10, { stroke: 'ink', line: 0.5 }),
        ];
      case 'earphone':
        return [...common, wire(`M${x} ${level}V${FOOT}`), ...earphoneUpright(x, middle)];
    }
  });
}

export function circuitSentence(view: CircuitView): string {
  const say = (label: Label) => `${label.ref}, ${label.value}`;
  const { tuning } = view;
  const ways = {
    direct: 'straight to the coil',
    'series-c': 'through a capacitor to the coil',
    'aerial-tap': 'to a tap of the coil',
    primary: 'to a winding of its own beside the coil',
  } as const;
  const tuned =
    'label' in tuning
      ? `tuned by ${say(tuning.label)}`
      : tuning.kind === 'slider'
        ? 'tuned by a contact along it'
        : 'tuned by its own inductance';
  const load = [view.returnResistor, view.bypass, view.transformer].filter((label) => label !== null).map(say);
  const across = load.length > 0 ? ` with ${load.join('; ')}` : '';
  const from = view.detectorAt === 'tap' ? 'a tap' : 'the top';
  return `Circuit: the aerial goes ${ways[view.coupling.kind]} ${say(view.coil)}, ${tuned}. From ${from} the detector ${say(view.detector)} feeds the earphone ${say(view.earphone)}${across}. The foot goes to earth.`;
}
