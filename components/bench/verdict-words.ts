import type { Finding } from '@/services/kits/rules';
import { notesIn, stopsIn } from '@/services/kits/rules';
import type { Verdict } from '@/services/receiver';
import type { SignKind } from '@/components/ui/sign';
import { shownDifference, shownEdge, shownKHz } from '@/templates/drawings/reach-axis';

export interface Headline {
  sign: SignKind;
  title: string;
  /** The fact with its figure, then what to do. */
  text: string;
}

const titles: readonly [codes: readonly string[], title: string][] = [
  [['PHONE-Z', 'PHONE-DC', 'PHONE-LOWPASS'], 'The earphone does not suit'],
  [['DET-UNSUIT', 'DET-DATA'], 'The detector does not suit'],
  [['BAND-GAP'], 'A gap inside the band'],
  [['BAND-YIELD'], 'Too few boxes reach both ends'],
  [['COIL-SRF'], 'The coil resonates by itself'],
  [['FORMER-SHORT'], 'The former is too short'],
  [['WIRE-SHORT'], 'The wire is too short'],
  [['GUIDE-MISS'], 'The guide is not complete'],
];

const kHz = (hertz: number) => Math.round(hertz / 1000);

/** The verdict as a sentence: the worst thing first, and its figure. */
export function headlineOf(verdict: Verdict, findings: readonly Finding[], band: { lo: number; hi: number }): Headline {
  const stops = stopsIn(findings);
  const notes = notesIn(findings);
  if (stops.length === 0) return clears(verdict, notes.length, band);
  const more =
    stops.length > 1 ? ` ${stops.length - 1} more ${stops.length === 2 ? 'finding stops' : 'findings stop'} it.` : '';
  const low = stops.find(({ code }) => code === 'BAND-LOW');
  const high = stops.find(({ code }) => code === 'BAND-HIGH');
  if (low || high) {
    const title = low && high ? 'Short at both ends' : low ? 'Short at the low end' : 'Short at the high end';
    return { sign: 'stops', title, text: shortText(verdict, band, { low: Boolean(low), high: Boolean(high) }) };
  }
  const [first] = stops;
  const title = titles.find(([codes]) => codes.includes(first?.code ?? ''))?.[1] ?? 'A rule stops it';
  return { sign: 'stops', title, text: `${first?.message ?? ''}${more}` };
}

function shortText(
  { reach }: Verdict,
  band: { lo: number; hi: number },
  short: { low: boolean; high: boolean },
): string {
  const { lo, hi } = reach.corners;
  if (short.low && short.high) {
    return `At worst case this version tunes ${shownKHz(lo)} to ${shownKHz(hi)} kHz. The band asks for ${shownEdge(band.lo)} to ${shownEdge(band.hi)}.`;
  }
  if (short.low) {
    return `At worst case this version stops at ${shownKHz(lo)} kHz. The band asks for ${shownEdge(band.lo)}, so ${shownDifference(lo - band.lo)} kHz is out of reach.`;
  }
  return `At worst case this version ends at ${shownKHz(hi)} kHz. The band asks for ${shownEdge(band.hi)}, so ${shownDifference(band.hi - hi)} kHz is out of reach.`;
}

function clears({ reach }: Verdict, notes: number, band: { lo: number; hi: number }): Headline {
  const { lo, hi } = reach.corners;
  const text =
    lo <= band.lo && hi >= band.hi
      ? `At worst case this version tunes ${shownKHz(lo)} to ${shownKHz(hi)} kHz: spare ${shownDifference(band.lo - lo)} below the band and ${shownDifference(hi - band.hi)} above it.`
      : `At nominal values it covers the band. At worst case it tunes ${shownKHz(lo)} to ${shownKHz(hi)} kHz; the share of boxes decides.`;
  const title =
    notes === 0 ? 'Clears every rule' : notes === 1 ? 'Clears, with one note' : `Clears, with ${notes} notes`;
  return { sign: notes === 0 ? 'clears' : 'note', title, text };
}

/** "99.9 %"; never 100 as a promise: then the count alone speaks. */
export function shareWords(share: Verdict['share']): { figure: string; text: string } | null {
  if (!share) return null;
  const grouped = (count: number) => String(count).replace(/\B(?=(\d{3})+$)/g, count >= 10_000 ? '\u202f' : '');
  if (share.covered === share.boxes)
    return { figure: grouped(share.boxes), text: `of ${grouped(share.boxes)} tried boxes reach both ends` };
  const percent = Math.min(99.9, Math.round((share.covered / share.boxes) * 1000) / 10);
  return { figure: `${percent.toFixed(1)}\u202f%`, text: `of ${grouped(share.boxes)} tried boxes reach both ends` };
}

export const signOf = (severity: Finding['severity']): SignKind =>
  severity === 'stop' ? 'stops' : severity === 'note' ? 'note' : 'info';

/** A finding's figure with the unit the engine gives it, for the end of its row. */
export function figureOf({ value, unit, code }: Pick<Finding, 'value' | 'unit' | 'code'>): string | null {
  if (value === null || !Number.isFinite(value) || code === 'GUIDE-MISS') return null;
  const plain = (figure: number, digits = 3) => String(Number(figure.toPrecision(digits))).replace('-', '\u2212');
  if (unit === 'Hz') return value >= 10_000 ? `${kHz(value)}\u202fkHz` : `${Math.round(value)}\u202fHz`;
  if (unit === 'm' && value < 0.5) return `${plain(value * 1000)}\u202fmm`;
  if (unit === '1' || unit === '') return Math.abs(value) <= 1 ? `${plain(value * 100)}\u202f%` : plain(value, 4);
  if (unit === 'ohm') return value >= 1000 ? `${plain(value / 1000)}\u202fkΩ` : `${plain(value)}\u202fΩ`;
  return `${plain(value)}\u202f${unit}`;
}
