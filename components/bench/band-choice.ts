import { BANDS, type BandEntry } from '@/services/receiver';
import type { KitBand } from '@/services/kits/schemas';

const names: Record<string, string> = { LW: 'Long wave', MW: 'Medium wave' };
const regions = ['', 'ITU region 1', 'ITU region 2', 'ITU region 3'];

export interface BandChoice {
  id: string;
  label: string;
  /** Frequencies in words: "526.5 to 1606.5 kHz, every 9". */
  detail: string;
  band: KitBand;
}

const shown = (hertz: number) => String(hertz / 1000);

/** The bands a kit may be made for. The region is the designer's choice. */
export const bandChoices: readonly BandChoice[] = BANDS.map((entry) => ({
  id: idOf(entry),
  label: [names[entry.code] ?? `Short wave, ${entry.code}`, regions[entry.region]].filter((word) => word).join(', '),
  detail: `${shown(entry.lo)} to ${shown(entry.hi)} kHz, every ${shown(entry.step)}`,
  band: {
    code: idOf(entry).slice(0, 20),
    lo: entry.lo,
    hi: entry.hi,
    firstCarrier: entry.firstCarrier,
    lastCarrier: entry.lastCarrier,
    step: entry.step,
  },
}));

function idOf({ code, region }: BandEntry): string {
  return region === 0 ? code : `${code}-${region}`;
}

/** Own edges: carriers every `step` from the lower edge plus half of it. */
export function ownBand(lo: number, hi: number, step: number): KitBand {
  const first = lo + step / 2;
  const count = Math.max(0, Math.floor((hi - step / 2 - first) / step + 1e-9));
  return { code: 'own', lo, hi, firstCarrier: first, lastCarrier: first + count * step, step };
}
