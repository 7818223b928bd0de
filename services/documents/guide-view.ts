import { cautionNote, cautions } from '../kits/cautions';
import type { FrozenLine, GuideStep, VersionContent } from '../kits/schemas';
import type { BoxPapers } from '../packing';
import { countPieces } from '../packing/rules';
import { showKHz } from '../quantity';
import type { Contour, Verdict } from '../receiver';
import { showDate } from '../time';
import { circuitView } from './circuit-view';
import { coilView } from './coil-view';
import { faultsOf } from './faults';
import { guidePart } from './part-names';
import { printable } from './rules';
import type { GuideStepView, GuideView, PrintReach } from './schemas';
import { contactOf, sellerLine } from './seller-line';

/** The build guide of one box, in words and figures; how it is set on paper or on a page is the template's matter. */
export function guideView(papers: BoxPapers, verdict: Verdict, chance: Contour | null): GuideView {
  const { content, plate, serial } = papers;
  const coil = coilView(content, verdict);
  const inBox = content.lines.filter((line) => line.place !== 'packaging' && line.place !== 'print');
  const parts = inBox.map(guidePart).filter((part) => part !== null);
  return {
    seller: sellerLine(),
    plate: { number: plate.kitNumber, letter: plate.letter, name: plate.kitName },
    serial,
    hash: papers.hash,
    code: papers.guideCode,
    summary: printable(content.kit.summary),
    audience: printable(content.kit.audience),
    ageFrom: content.kit.ageFrom,
    intro: printable(content.guide.intro),
    released: papers.signOff && { by: papers.signOff.by, on: showDate(papers.signOff.at) },
    withdrawn:
      papers.versionState === 'withdrawn'
        ? 'This version was withdrawn after your box was packed. Write to the yard before you build it.'
        : '',
    reach: reachOf(content, verdict, chance),
    cautions: content.guide.cautions.map((code) => cautions[code]),
    cautionNote,
    needs: needsOf(content),
    parts,
    pieces: countPieces(inBox.flatMap(counted)).needed,
    tools: toolsOf(content),
    winding: coil.winding,
    windingRows: coil.rows,
    tapRows: coil.taps,
    circuit: circuitView(content),
    steps: content.guide.steps.map((step, index, all) => stepView(content, step, index, all.length, coil.gate)),
    tune: tuneRows(verdict),
    faults: faultsOf(content),
    missing: `Write to ${contactOf()} with ${serial} and the reference on its line, such as ${parts[0]?.reference ?? 'L1'}. It goes out the same day, and you need not send anything back.`,
  };
}

const counted = ({ part, quantity }: FrozenLine) => (part ? [{ unit: part.unit, needed: quantity, packed: 0 }] : []);

export function reachOf(content: VersionContent, verdict: Verdict, chance: Contour | null): PrintReach {
  const { band } = content.kit;
  return {
    band: { lo: band.lo, hi: band.hi },
    nominal: verdict.reach.nominal,
    worst: verdict.reach.corners,
    contour: chance && { f: [...chance.f], share: [...chance.share] },
    stations: content.circuit.place.stations.map(({ name, f }) => ({ name, f })),
  };
}

/** What the set needs outside the box; without it nothing is heard. */
function needsOf({ circuit }: VersionContent): string[] {
  const { vertical, horizontal } = circuit.aerial;
  const aerial =
    horizontal > 0
      ? `Room for ${vertical + horizontal} m of aerial: ${vertical} m up from the set, ${horizontal} m along.`
      : `Room for ${vertical} m of aerial, straight up from the set.`;
  const earth =
    circuit.earth.kind === 'none'
      ? 'A second wire under the aerial, as long as it, in place of an earth.'
      : 'A real earth: a rod in moist ground, or an earth that a competent person approves.';
  return [aerial, earth, 'An adult for drilling, cutting, soldering and for hanging the aerial.'];
}

function toolsOf({ lines }: VersionContent): string[] {
  const inBox = lines.flatMap((line) =>
    line.place === 'tool' && line.part ? [`${printable(line.part.name)} (${line.reference}, in the box)`] : [],
  );
  return [
    ...inBox,
    'Side cutters, a small flat screwdriver, adhesive tape',
    'A meter that reads ohms',
    'Eye protection, whenever a wire is cut',
  ];
}

function stepView(
  content: VersionContent,
  step: GuideStep,
  index: number,
  count: number,
  gate: GuideView['steps'][number]['gate'],
): GuideStepView {
  const used = content.lines.filter((line) => step.uses.includes(line.reference));
  // The step that lays wire on the former is the one that winds it; a later one may only mount the coil.
  const winds =
    used.some((line) => line.part?.values.kind === 'coil-former') &&
    used.some((line) => line.part?.values.kind === 'wire');
  return {
    number: index + 1,
    title: printable(step.title),
    text: printable(step.text),
    uses: used.map(guidePart).filter((part) => part !== null),
    check: printable(step.check),
    gate: winds ? gate : null,
    drawing: winds ? 'winding' : index === count - 1 || joinsSeveral(used) ? 'circuit' : 'parts',
  };
}

/** A step that wires parts together is understood from the circuit, one that handles parts from their pictures. */
function joinsSeveral(used: readonly FrozenLine[]): boolean {
  const electric = ['tuning coil', 'tuning capacitor', 'coupling capacitor', 'detector', 'return resistor', 'earphone'];
  const places = new Set(used.filter((line) => electric.includes(line.place)).map((line) => line.place));
  return places.size >= (places.has('tuning coil') ? 2 : 3);
}

function tuneRows({ reach }: Verdict): GuideView['tune'] {
  const say = (f: number) => printable(showKHz(f));
  return [
    {
      end: 'Capacitor closed',
      nominal: say(reach.nominal.lo),
      worst: `${say(reach.corners.lo)} or lower`,
      hint: 'the low end: longest waves',
    },
    {
      end: 'Capacitor open',
      nominal: say(reach.nominal.hi),
      worst: `${say(reach.corners.hi)} or higher`,
      hint: 'the high end: shortest waves',
    },
  ];
}
