import type { Figures } from '../figures';
import type { Finding } from '../verdict';
import {
  aerialResonance,
  bandAerial,
  bandCorner,
  bandGap,
  bandHigh,
  bandLow,
  bandYield,
  dataNone,
  lotSmall,
} from './band';
import { adjacentChannel, loadedQ, noEarth, selfResonance, shortFormer, strongStations } from './circuit';
import { detectorData, detectorUnsuited, detectorWeak } from './detector';
import { damping, directPath, earphoneShare, level, lowpass } from './earphone';
import type { Found } from './finding';
import { unusual } from './units';

/** The catalogue in the order of receiver.md H. Findings that a design file alone can never give are not in it. */
export const CATALOGUE: readonly (readonly [code: string, look: (figures: Figures) => Found[]])[] = [
  ['BAND-LOW', bandLow],
  ['BAND-HIGH', bandHigh],
  ['BAND-CORNER', bandCorner],
  ['BAND-GAP', bandGap],
  ['BAND-YIELD', bandYield],
  ['BAND-AERIAL', bandAerial],
  ['AERIAL-RES', aerialResonance],
  ['SEL-ADJ', adjacentChannel],
  ['SEL-STRONG', strongStations],
  ['Q-LOW', loadedQ],
  ['COIL-SRF', selfResonance],
  ['DET-UNSUIT', detectorUnsuited],
  ['DET-WEAK', detectorWeak],
  ['DET-DATA', detectorData],
  ['PHONE-Z', earphoneShare],
  ['PHONE-DC', directPath],
  ['PHONE-LOWPASS', lowpass],
  ['PHONE-DAMP', damping],
  ['PHONE-LEVEL', level],
  ['EARTH-NONE', noEarth],
  ['DATA-NONE', dataNone],
  ['LOT-SMALL', lotSmall],
  ['FORMER-SHORT', shortFormer],
  ['UNIT-ODD', unusual],
];

/** Every finding of a design, each with what would clear it; the codes that already stop go to the remedy's search. */
export function findingsOf(
  figures: Figures,
  remedyOf: (found: Found, stops: ReadonlySet<string>) => Finding['remedy'],
): Finding[] {
  const all = CATALOGUE.flatMap(([, look]) => look(figures));
  const stops = new Set(all.filter((found) => found.severity === 'stop').map((found) => found.code));
  return all.map((found) => ({ ...found, remedy: remedyOf(found, stops) }));
}
