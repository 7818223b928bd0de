import type { Verdict } from '../receiver';
import type { Finding } from '../kits/rules';
import { wireNeeded } from '../kits/rules';
import type { VersionContent } from '../kits/schemas';
import { grouped, showEdge, showKHz, showQuantity } from '../quantity';
import type { Cleared } from './schemas';

interface Rule {
  /** The codes whose finding would stand here instead. */
  codes: readonly string[];
  title: string;
  /** What the rule asks and by what it clears; null where the version gives it nothing to judge. */
  says(verdict: Verdict, content: VersionContent): { text: string; figure: string } | null;
}

const percent = (share: number) => `${(share * 100).toFixed(1)}\u202f%`;
/** Rounded down, so that what is sure is never said to be more: 99.98 %, not 100. */
const sure = (share: number) => `${(Math.floor(share * 10_000) / 100).toFixed(2)}\u202f%`;

/** The rules of the catalogue in its order, with what each says of a version that clears it. */
const rules: readonly Rule[] = [
  {
    codes: ['BAND-LOW'],
    title: 'Low end',
    says: ({ reach }, { kit }) => ({
      text: `The band starts at ${showEdge(kit.band.lo)}.`,
      figure: showKHz(reach.nominal.lo),
    }),
  },
  {
    codes: ['BAND-HIGH'],
    title: 'High end',
    says: ({ reach }, { kit }) => ({
      text: `The band ends at ${showEdge(kit.band.hi)}.`,
      figure: showKHz(reach.nominal.hi),
    }),
  },
  {
    codes: ['BAND-CORNER', 'BAND-LOW', 'BAND-HIGH'],
    title: 'Worst combination of parts',
    says: ({ reach }) => ({
      text: 'Both ends hold with every tolerance against them.',
      figure: `${Math.round(reach.corners.lo / 1000)}\u2013${showKHz(reach.corners.hi)}`,
    }),
  },
  {
    codes: ['BAND-GAP', 'BAND-LOW', 'BAND-HIGH'],
    title: 'Every carrier between the ends',
    says: (_verdict, { kit }) => ({
      text: 'No carrier of the band is left out.',
      figure: `${grouped(Math.round((kit.band.lastCarrier - kit.band.firstCarrier) / kit.band.step) + 1)} carriers`,
    }),
  },
  {
    codes: ['BAND-YIELD', 'BAND-LOW', 'BAND-HIGH'],
    title: 'Tried boxes that reach both ends',
    says: ({ share }) =>
      share === null
        ? null
        : {
            text: `At least ${sure(share.low)} of all boxes is sure.`,
            figure: `${grouped(share.covered)} of ${grouped(share.boxes)}`,
          },
  },
  {
    codes: ['BAND-AERIAL', 'BAND-LOW', 'BAND-HIGH'],
    title: 'Half and double the aerial',
    says: ({ reach }) => ({
      text: 'The band stays covered with a shorter and a longer wire.',
      figure: `${Math.round(Math.max(reach.aerialHalf.lo, reach.aerialDouble.lo) / 1000)}\u2013${showKHz(Math.min(reach.aerialHalf.hi, reach.aerialDouble.hi))}`,
    }),
  },
  {
    codes: ['AERIAL-RES'],
    title: 'Aerial resonance',
    says: () => ({ text: 'The aerial does not resonate inside the band.', figure: 'none' }),
  },
  {
    codes: ['Q-LOW'],
    title: 'Loaded Q',
    says: ({ points }) => {
      const worst = Math.min(...points.flatMap(({ q }) => (q === null ? [] : [q])));
      return Number.isFinite(worst)
        ? { text: 'At the worst of three places in the band.', figure: worst.toFixed(1) }
        : null;
    },
  },
  {
    codes: ['COIL-SRF'],
    title: 'Self-resonance of the coil',
    says: ({ coil }) =>
      coil.selfResonance === null
        ? null
        : { text: 'More than twice the top of the band.', figure: showKHz(coil.selfResonance) },
  },
  {
    codes: ['DET-UNSUIT', 'DET-WEAK'],
    title: 'Detector suits the signal',
    says: ({ detector }) =>
      detector.relative === null
        ? null
        : { text: 'Against a germanium diode in its place.', figure: detector.relative.toFixed(2) },
  },
  {
    codes: ['PHONE-Z'],
    title: 'Earphone takes the power',
    says: ({ earphone }, content) => {
      const isCeramic = content.lines.some(
        ({ part }) => part?.values.kind === 'earphone' && part.values.earphoneKind === 'ceramic',
      );
      const share = isCeramic ? earphone.voltageShare : earphone.powerShare;
      if (share === null) return null;
      return {
        text: isCeramic ? 'Share of the audio voltage.' : 'Share of the audio power on offer.',
        figure: percent(share),
      };
    },
  },
  {
    codes: ['PHONE-DC'],
    title: 'Path for direct current',
    says: () => ({ text: 'The detector has a path through the earphone or its resistor.', figure: 'there' }),
  },
  {
    codes: ['PHONE-LEVEL'],
    title: 'Speech above threshold',
    says: ({ earphone }, { circuit }) =>
      earphone.level === null
        ? null
        : { text: `At ${showQuantity(circuit.place.field, 'mV/m')}.`, figure: `${earphone.level.toFixed(1)}\u202fdB` },
  },
  {
    codes: ['WIRE-SHORT'],
    title: 'Wire for the winding',
    says: (_verdict, content) => {
      const needed = wireNeeded(content);
      const line = content.lines.find((one) => one.place === 'tuning coil' && one.part?.values.kind === 'wire');
      if (needed === null || !line) return null;
      return {
        text: `The winding takes ${showQuantity(needed, 'm')} with its ends.`,
        figure: showQuantity(line.quantity / 1000, 'm'),
      };
    },
  },
  {
    codes: ['GUIDE-MISS'],
    title: 'Guide follows the parts',
    says: (_verdict, { guide }) => ({
      text: 'Every line is named in a step, and every caution stands.',
      figure: guide.steps.length === 1 ? '1 step' : `${guide.steps.length} steps`,
    }),
  },
];

/** The rules without a stop or a note, with the figure each clears by. */
export function clearedRules(verdict: Verdict, content: VersionContent, findings: readonly Finding[]): Cleared[] {
  const standing = new Set(findings.filter(({ severity }) => severity !== 'info').map(({ code }) => code));
  return rules.flatMap(({ codes, title, says }) => {
    if (codes.some((code) => standing.has(code))) return [];
    const said = says(verdict, content);
    return said ? [{ code: codes[0] ?? '', title, ...said }] : [];
  });
}
