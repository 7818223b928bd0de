import { audioAt } from './audio';
import { boxesOf } from './coverage/boxes';
import { cornersOf } from './coverage/corners';
import { limitsOf } from './coverage/limits';
import { marginsOf, reachAsFilled, reachOf, scanPoints, type Ends } from './coverage/reach';
import { directResistance } from './coils/loss';
import { resonance } from './coils/self-capacitance';
import type { Design } from './design';
import { detectorFacts } from './detector/facts';
import { earphoneCircuit } from './earphone/facts';
import { audioLoad, directLoad, OPEN } from './earphone/loads';
import { middleOf, type Figures, type Sounding } from './figures';
import { coilResistanceAt } from './network/solve';
import { sectionRows } from './network/fill-wound';
import { planOf, type Plan } from './network/plan';
import type { Rules } from './rules';
import { centre } from './schema/value';
import { loadAt, soundingAt } from './soundings';
import { TWO_PI } from './units';
import type { Verdict } from './verdict';

/**
 * How far a design is worked out. A verdict takes all; `corners` leaves the boxes out; a trial of a remedy takes the
 * nominal figures and what its finding is told from: the worst corner, other aerials, or the share of boxes.
 */
export type SurveyDepth = 'verdict' | 'corners' | 'nominal' | 'worst' | 'aerials' | 'share';

export interface SurveyOptions {
  depth: SurveyDepth;
  seed: number;
  /** 0 leaves the boxes out as well. */
  boxes: number;
  rules: Rules;
  onProgress?: ((done: number, total: number) => void) | undefined;
  /** Draws stop once more boxes than this have missed. */
  mostMissed?: number | undefined;
}

/** A plan with the detector's load of the middle of the band, at nominal values; and the scan's frequencies. */
export interface Prepared {
  plan: Plan;
  points: Float64Array;
}

export function prepared(design: Design): Prepared {
  const plan = planOf(design);
  plan.fill(plan.nominal);
  loaded(plan);
  return { plan, points: scanPoints(plan) };
}

function loaded(plan: Plan): void {
  const { design } = plan;
  const phone = earphoneCircuit(design);
  loadAt(plan, detectorFacts(design).diode, directLoad(phone) ?? OPEN, middleOf(design));
  plan.fill(plan.nominal);
}

/** Margins of the nominal reach alone. */
export function nominalMargins(design: Design): Ends {
  const plan = planOf(design);
  plan.fill(plan.nominal);
  // With one node the detector's conductance lies across the tuned circuit and moves no frequency.
  if (plan.circuit.sections > 1 || plan.circuit.primary) loaded(plan);
  return marginsOf(reachAsFilled(plan, plan.nominal, scanPoints(plan)), design.band);
}

function aerialScaled({ plan, points }: Prepared, scale: number): Ends {
  plan.circuit.aerialScale = scale;
  const ends = reachOf(plan, plan.nominal, points);
  plan.circuit.aerialScale = 1;
  return ends;
}

function coilOf({ plan }: Prepared): Verdict['coil'] {
  const { circuit, design, wound } = plan;
  const { coil } = design;
  const f = middleOf(design);
  const factor = coil.lFactor === undefined ? 1 : centre(coil.lFactor);
  let sections = [[circuit.l]];
  if (coil.kind === 'measured' && coil.sections !== undefined) {
    const rows = coil.sections;
    sections = rows.map((_, i) =>
      rows.map((_row, j) => factor * centre(rows[Math.min(i, j)]?.[Math.max(i, j)] ?? NaN)),
    );
  } else if (wound !== null && coil.taps !== undefined) {
    const taps = [coil.taps.aerial, coil.taps.detector].filter((tap) => tap !== undefined);
    const ends = [...new Set(taps)].sort((a, b) => a - b);
    sections = sectionRows(wound, [...ends, wound.turns]).map((row) => row.map((l) => factor * l));
  }
  const wire = wound === null ? null : wound.wireLength();
  return {
    l: circuit.l,
    sections,
    q: (TWO_PI * f * circuit.l) / coilResistanceAt(circuit, f),
    cSelf: circuit.cSelf,
    selfResonance: circuit.l * circuit.cSelf > 0 ? resonance(circuit.l, circuit.cSelf) : null,
    wireLength: wire,
    length: wound === null ? null : wound.length(),
    rDc:
      wound === null || wire === null
        ? null
        : directResistance(wire, wound.wire.bare, wound.wire.strands, centre(design.temperature)),
  };
}

/** Works out every figure of a design; the findings are made from them. */
export function survey(design: Design, options: SurveyOptions): Figures {
  const { seed, boxes, rules, depth, onProgress, mostMissed } = options;
  const whole = depth === 'verdict' || depth === 'corners';
  const ready = prepared(design);
  const { plan, points } = ready;
  const phone = earphoneCircuit(design);
  const detector = detectorFacts(design);
  const path = directLoad(phone);
  const dcLoad = path ?? OPEN;
  const load = audioLoad(phone);
  const loadG = plan.circuit.loadG;

  const nominal = reachOf(plan, plan.nominal, points);
  const reach = {
    nominal,
    corners: whole || depth === 'worst' ? cornersOf(plan, points, nominal) : nominal,
    aerialHalf: whole || depth === 'aerials' ? aerialScaled(ready, 0.5) : nominal,
    aerialDouble: whole || depth === 'aerials' ? aerialScaled(ready, 2) : nominal,
  };
  const limits = whole ? limitsOf(plan, points) : [];
  const share =
    (depth === 'verdict' || depth === 'share') && boxes > 0
      ? boxesOf(plan, { seed, boxes, confidence: rules.yieldConfidence, onProgress, mostMissed })
      : null;
  plan.fill(plan.nominal);
  const coil = coilOf(ready);

  const { band } = design;
  const sound = (f: number): Sounding => {
    const sounding = soundingAt(plan, detector.diode, dcLoad, f, { bandwidth: whole });
    plan.fill(plan.nominal);
    return sounding;
  };
  const soundings: Figures['soundings'] = [sound(band.firstCarrier), sound(middleOf(design)), sound(band.lastCarrier)];
  plan.circuit.loadG = loadG;

  return {
    design,
    rules,
    plan,
    points,
    phone,
    detector,
    dcLoad,
    audio: load,
    soundings,
    audioFigures: audioAt({ design, detector, phone, dcLoad: path, load }, soundings[1]),
    reach,
    margins: marginsOf(nominal, band),
    cornerMargins: marginsOf(reach.corners, band),
    share,
    limits,
    coil,
  };
}
