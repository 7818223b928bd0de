import { type Verdict, enamel, wireLength } from '../receiver';
import { cautions } from './cautions';
import { valuesAt } from './design-of';
import { CautionCode, type FrozenLine, type VersionContent } from './schemas';

export type Finding = Verdict['findings'][number];

/** Findings that need the rest of the version: guide, cautions, wire and aerial in the box (receiver.md H). */
export function versionFindings(content: VersionContent): Finding[] {
  return [guideMiss(content), wireShort(content), aerialShort(content)].filter((finding) => finding !== null);
}

function guideMiss({ guide, lines }: VersionContent): Finding | null {
  const lacks: string[] = [];
  if (guide.intro === '') lacks.push('an introduction');
  if (guide.steps.length === 0) lacks.push('its steps');
  for (const [index, step] of guide.steps.entries()) {
    if (step.title === '' || step.text === '') lacks.push(`the words of step ${index + 1}`);
  }
  const missing = CautionCode.options.filter((code) => !guide.cautions.includes(code));
  if (missing.length > 0) lacks.push(cautionWords(missing));
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

function cautionWords(missing: readonly CautionCode[]): string {
  if (missing.length === CautionCode.options.length) return 'all of its cautions';
  if (missing.length > 3) return `${missing.length} of its cautions`;
  return `the caution${missing.length === 1 ? '' : 's'} ${missing.map((code) => `"${cautions[code].title}"`).join(', ')}`;
}

/** Lines a builder fits into the set, so that a step of the guide has to name them. */
const isBuiltIn = (line: FrozenLine) => !['tool', 'print', 'packaging'].includes(line.place);

/** Two ends of 150 mm, and a loop of 80 mm a tap: metres (common practice; coils-and-capacitors, D). */
const LEADS = 0.3;
const TAP_LOOP = 0.08;

/** Metres of wire that the winding takes with its tails and taps; null while the coil is not chosen. */
export function wireNeeded(content: Pick<VersionContent, 'lines' | 'circuit'>): number | null {
  const former = valuesAt(content, 'tuning coil', 'coil-former');
  const wire = valuesAt(content, 'tuning coil', 'wire');
  if (!former || !wire) return null;
  const { winding } = content.circuit;
  const overall = wire.overall || enamel(wire.bare, 1).nominal;
  return wireLength({
    turns: winding.turns,
    diameter: former.outerDiameter.nominal + overall,
    // A winding by hand takes 3 % more than wire laid side by side (coils-and-capacitors, J).
    pitch: winding.pitch ?? 1.03 * overall,
    leads: LEADS,
    taps: [winding.aerialTap, winding.detectorTap].filter((tap) => tap !== null).length,
    tapLoop: TAP_LOOP,
  });
}

function wireShort(content: VersionContent): Finding | null {
  const line = content.lines.find((one) => one.place === 'tuning coil' && one.part?.values.kind === 'wire');
  const needed = wireNeeded(content);
  if (needed === null || !line) return null;
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
