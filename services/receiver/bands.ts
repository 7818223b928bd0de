import { InvalidInput } from './invalid-input';
import type { Hertz } from './units';

export interface BandEntry {
  code: string;
  /** ITU region; 0 where the band is the same everywhere. */
  region: 0 | 1 | 2 | 3;
  lo: Hertz;
  hi: Hertz;
  firstCarrier: Hertz;
  lastCarrier: Hertz;
  step: Hertz;
}

const kHz = (
  code: string,
  region: BandEntry['region'],
  lo: number,
  hi: number,
  first: number,
  last: number,
  step: number,
): BandEntry => ({
  code,
  region,
  lo: lo * 1000,
  hi: hi * 1000,
  firstCarrier: first * 1000,
  lastCarrier: last * 1000,
  step: step * 1000,
});

const shortWave = (code: string, lo: number, hi: number, region: BandEntry['region'] = 0): BandEntry =>
  kHz(code, region, lo, hi, lo, hi, 5);

/** Broadcast bands. Region is a choice of the designer, never guessed. @see receiver.md A for the origin of each edge */
export const BANDS: readonly BandEntry[] = [
  kHz('LW', 1, 148.5, 283.5, 153, 279, 9),
  kHz('MW', 1, 526.5, 1606.5, 531, 1602, 9),
  kHz('MW', 2, 525, 1705, 530, 1700, 10),
  kHz('MW', 3, 526.5, 1606.5, 531, 1602, 9),
  shortWave('120 m', 2300, 2495),
  shortWave('90 m', 3200, 3400),
  shortWave('75 m', 3950, 4000, 1),
  shortWave('75 m', 3900, 4000, 3),
  shortWave('60 m', 4750, 4995),
  shortWave('49 m', 5900, 6200),
  shortWave('41 m', 7200, 7450, 1),
  shortWave('41 m', 7300, 7400, 2),
  shortWave('41 m', 7200, 7450, 3),
  shortWave('31 m', 9400, 9900),
  shortWave('25 m', 11600, 12100),
  shortWave('22 m', 13570, 13870),
  shortWave('19 m', 15100, 15800),
  shortWave('16 m', 17480, 17900),
  shortWave('15 m', 18900, 19020),
  shortWave('13 m', 21450, 21850),
  shortWave('11 m', 25670, 26100),
];

/** The band of a code in a region. */
export function bandOf(code: string, region?: number): BandEntry {
  const found = BANDS.find(
    (band) => band.code === code && (region === undefined || band.region === 0 || band.region === region),
  );
  if (found === undefined)
    throw new InvalidInput([
      { path: 'band', message: `There is no band ${code} in that region: choose one of the list.` },
    ]);
  return found;
}

type Channels = Pick<BandEntry, 'firstCarrier' | 'lastCarrier' | 'step'>;

export function carrierCount({ firstCarrier, lastCarrier, step }: Channels): number {
  return Math.floor((lastCarrier - firstCarrier) / step + 1e-9) + 1;
}

/** The carrier n steps above the first. */
export function nthCarrier({ firstCarrier, step }: Pick<Channels, 'firstCarrier' | 'step'>, n: number): Hertz {
  return firstCarrier + n * step;
}

/** The carrier nearest to a frequency, held to the band's ends. */
export function nearestCarrier(channels: Channels, f: Hertz): Hertz {
  const n = Math.round((f - channels.firstCarrier) / channels.step);
  return nthCarrier(channels, Math.min(carrierCount(channels) - 1, Math.max(0, n)));
}
