import { resonance } from '../coils/self-capacitance';
import { scanPoints } from '../coverage/reach';
import type { Design } from '../design';
import { middleOf } from '../figures';
import type { Circuit } from '../network/circuit';
import { planOf, type Plan } from '../network/plan';
import { capacitanceNeeded, sourceResistance } from '../network/solve';
import { at } from '../numeric/cells';
import { nominalMargins } from '../survey';
import { AERIAL_TAP, billOf, FIRST_CAPACITOR, type Choice, type Settled } from './ask';
import { neededBetween, type Between } from './needed-between';
import type { Candidate } from './ranking';
import type { ReadLists } from './read-lists';
import { soundBoundOf, type SoundBound } from './sound-bound';
import { placementsOf, type Field, type Placement } from './windings';

/** A combination may still be listed: neither dearer, nor of less margin, nor worse in store than the last listed. */
export type MayBeListed = (candidate: Candidate) => boolean;

export interface Winding {
  former: number;
  wire: number;
  turns: number;
}

/** Ends of the tuning capacitor, and its loss. */
interface Gang {
  place: number;
  min: number;
  max: number;
  tan: number;
}

/** The detector's conductance over all phones, and what is bounded with each of them. */
interface Sound {
  place: number;
  cj: number;
  least: number;
  most: number;
  phones: SoundBound[];
}

export interface Screen {
  /** Combinations of a winding that no bound dismisses; the guard is the margin that they need at both ends. */
  candidates(winding: Winding, guard: number, mayBeListed: MayBeListed): Candidate[];
  /** Smaller of the two nominal margins of a combination, worked out. */
  marginOf(choice: Choice): number;
}

/** No margin is larger: the scan for the low end begins at 0.3 of the band's lower edge. */
const MOST_MARGIN = 0.7;
/** Margins that are asked in turn where margin ranks: the first that cannot be is a bound. */
const LEVELS = [0.02, 0.04, 0.07, 0.1, 0.14, 0.18, 0.23, 0.28, 0.34, 0.4, 0.47, 0.54, 0.62];

/** Two scan points that a reach of a margin must hold between them; null where the band is too narrow for the bound. */
function edges(points: Float64Array, { band }: Design, guard: number): { low: number; high: number } | null {
  const lowest = band.lo * (1 - guard) * (1 + 1e-12);
  const highest = band.hi * (1 + guard) * (1 - 1e-12);
  let low = NaN;
  let high = NaN;
  for (const point of points) {
    if (Number.isNaN(low) && point > lowest) low = point;
    if (point < highest) high = point;
  }
  return low <= high ? { low, high } : null;
}

/**
 * Dismisses combinations without working them out. Reach: by its own definition the low end lies at or below `low` only
 * if C_need has fallen to Cmax at a scan point up to there, and the high end above `high` only if C_need neither rose nor
 * fell below Cmin on the way; so C_need(low) <= Cmax and C_need(high) >= Cmin, or BAND-LOW or BAND-HIGH stands. No
 * assumption about the circuit enters. Sound: `sound-bound.ts`. The rest are the rules themselves.
 */
export function screenOf(ask: Settled, field: Field, read: ReadLists): Screen {
  const { template } = read;
  const gangs = gangsOf(field, read);
  const sounds = soundsOf(ask, field, read);
  const first = planOf(template);
  first.fill(first.nominal);
  const points = scanPoints(first);
  const middle = middleOf(template);
  const low: Between = { least: 0, most: 0 };
  const high: Between = { least: 0, most: 0 };

  const designOf = ({ former, wire, turns }: Winding, { coupling, aerialTap, detectorTap }: Placement): Design => {
    const tube = ask.lists.formers[former]?.values;
    const copper = ask.lists.wires[wire]?.values;
    if (tube === undefined || copper === undefined || template.coil.kind !== 'solenoid')
      throw new TypeError('Seek winds solenoids from its lists.');
    const { taps: _none, ...coil } = template.coil;
    const taps = {
      ...(aerialTap > 0 && { aerial: aerialTap }),
      ...(detectorTap > 0 && { detector: detectorTap }),
    };
    const c = ask.lists.couplings[coupling - FIRST_CAPACITOR]?.values;
    return {
      ...template,
      detectorAt: detectorTap > 0 ? 'tap' : 'top',
      coupling:
        coupling === AERIAL_TAP
          ? { kind: 'aerial-tap' }
          : c === undefined
            ? { kind: 'direct' }
            : { kind: 'series-c', c },
      coil: {
        ...coil,
        turns,
        formerDiameter: tube.diameter,
        formerLength: tube.length,
        former: tube.wall,
        wire: copper,
        ...(Object.keys(taps).length > 0 && { taps }),
      },
    };
  };

  const marginOf = (choice: Choice): number => {
    const [former, wire, turns, coupling, aerialTap, detectorTap, gang, detector, earphone, back] = choice;
    const design: Design = {
      ...designOf({ former, wire, turns }, { coupling, aerialTap, detectorTap }),
      tuning: read.tuning.get(gang) ?? template.tuning,
      detector: read.detectors.get(detector) ?? template.detector,
      earphone: read.earphones.get(earphone) ?? template.earphone,
      returnResistor: read.returnResistors.get(back),
    };
    const margins = nominalMargins(design);
    return Math.min(margins.lo, margins.hi);
  };

  const levels = ask.rank === 'margin' ? LEVELS : [];
  const levelEdges = levels.map((level) => edges(points, template, level));
  const lowNeeds = new Float64Array(levels.length);
  const highNeeds = new Float64Array(levels.length);
  const needLevels = (circuit: Circuit, { least, most }: Sound): void => {
    levelEdges.forEach((edge, i) => {
      if (edge === null) return;
      neededBetween(circuit, edge.low, least, most, low);
      neededBetween(circuit, edge.high, least, most, high);
      lowNeeds[i] = low.least;
      highNeeds[i] = high.most;
    });
  };
  const marginBound = ({ min, max }: Gang): number => {
    for (let i = 0; i < levels.length; i += 1) {
      if (levelEdges[i] !== null && (at(lowNeeds, i) > max || at(highNeeds, i) < min)) return levels[i] ?? MOST_MARGIN;
    }
    return MOST_MARGIN;
  };

  return {
    marginOf,
    candidates(winding, guard, mayBeListed) {
      const found: Candidate[] = [];
      const bounds = edges(points, template, guard);
      let plan: Plan | null = null;
      let taps: Placement | null = null;
      for (const placement of placementsOf(ask, field, winding.turns)) {
        const { coupling, aerialTap, detectorTap } = placement;
        if (plan === null || taps?.aerialTap !== aerialTap || taps.detectorTap !== detectorTap) {
          plan = planOf(designOf(winding, placement));
          plan.fill(plan.nominal);
          taps = placement;
          const { l, cSelf } = plan.circuit;
          if (l * cSelf > 0 && resonance(l, cSelf) <= template.band.hi) return found;
        }
        const { circuit } = plan;
        circuit.couplingC = coupling < FIRST_CAPACITOR ? 0 : (read.couplings.get(coupling - FIRST_CAPACITOR) ?? 0);
        for (const sound of sounds) {
          circuit.cj = sound.cj;
          let atLow = -Infinity;
          let atHigh = Infinity;
          if (bounds !== null) {
            neededBetween(circuit, bounds.low, sound.least, sound.most, low);
            neededBetween(circuit, bounds.high, sound.least, sound.most, high);
            atLow = low.least;
            atHigh = high.most;
          }
          let levelled = false;
          for (const gang of gangs) {
            if (atLow > gang.max || atHigh < gang.min) continue;
            circuit.loadG = 0;
            circuit.foilTan = gang.tan;
            const source = sourceResistance(circuit, middle, capacitanceNeeded(circuit, middle));
            if (!levelled) needLevels(circuit, sound);
            levelled = true;
            const margin = marginBound(gang);
            for (let i = 0; i < field.phones.length; i += 1) {
              const phone = field.phones[i];
              if (phone === undefined || sound.phones[i]?.mayClear(source) !== true) continue;
              const choice: Choice = [
                winding.former,
                winding.wire,
                winding.turns,
                coupling,
                aerialTap,
                detectorTap,
                gang.place,
                sound.place,
                phone.earphone,
                phone.back,
              ];
              const bill = billOf(ask, choice);
              if (ask.mostCost !== undefined && bill.cost > ask.mostCost) continue;
              if (ask.inStoreOnly === true && bill.builds < 1) continue;
              const candidate = { choice, ...bill, margin, exact: false };
              if (mayBeListed(candidate)) found.push(candidate);
            }
          }
        }
        circuit.foilTan = 0;
      }
      return found;
    },
  };
}

function gangsOf(field: Field, { template, tuning }: ReadLists): Gang[] {
  return field.capacitors.map((place) => {
    const plan = planOf({ ...template, tuning: tuning.get(place) ?? template.tuning });
    plan.fill(plan.nominal);
    const { cMin, cMax, foilTan } = plan.circuit;
    return { place, min: cMin, max: cMax, tan: foilTan };
  });
}

function soundsOf(ask: Settled, field: Field, read: ReadLists): Sound[] {
  const { template } = read;
  return field.detectors.map((place) => {
    const detector = read.detectors.get(place) ?? template.detector;
    const phones = field.phones.map(({ earphone, back }) =>
      soundBoundOf(
        {
          ...template,
          detector,
          earphone: read.earphones.get(earphone) ?? template.earphone,
          returnResistor: read.returnResistors.get(back),
        },
        ask.rules,
      ),
    );
    const plan = planOf({ ...template, detector });
    plan.fill(plan.nominal);
    return {
      place,
      cj: plan.circuit.cj,
      least: Math.min(...phones.map(({ conductance }) => conductance.least)),
      most: Math.max(...phones.map(({ conductance }) => conductance.most)),
      phones,
    };
  });
}
