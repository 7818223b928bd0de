import type { FrozenLine, VersionContent } from '../kits/schemas';
import { type Currency, type Money, times } from '../money';
import type { Verdict } from '../receiver';
import type { KitShape, PriceStep, Reach } from './schemas';

/** Every price and order of the shop is in this one currency. */
export const shopCurrency: Currency = 'GBP';

/** The highest step that the quantity reaches sets the price of all of it; null where no price is set. */
export function unitPrice(steps: readonly PriceStep[], quantity: number): Money | null {
  let best: PriceStep | null = null;
  for (const step of steps) {
    if (step.fromQuantity <= quantity && (!best || step.fromQuantity > best.fromQuantity)) best = step;
  }
  return best?.unit ?? null;
}

/** A larger quantity that costs less in all: the buyer is told, nobody profits from it. */
export function cheaperQuantity(
  steps: readonly PriceStep[],
  quantity: number,
): { quantity: number; total: Money } | null {
  const unit = unitPrice(steps, quantity);
  if (!unit) return null;
  const now = times(unit, quantity);
  const cheaper = steps
    .filter((step) => step.fromQuantity > quantity)
    .map((step) => ({ quantity: step.fromQuantity, total: times(step.unit, step.fromQuantity) }))
    .filter(({ total }) => total.minor < now.minor)
    .sort((a, b) => a.total.minor - b.total.minor);
  return cheaper[0] ?? null;
}

/** "medium wave", by where the band lies. */
export function bandName(band: { lo: number; hi: number }): string {
  if (band.hi <= 400_000) return 'long wave';
  return band.hi <= 1_800_000 ? 'medium wave' : 'short wave';
}

/** How the kit looks: from its parts, never typed in beside them. */
export function shapeOf(content: Pick<VersionContent, 'lines' | 'circuit'>): KitShape {
  const kinds = content.lines.map((line) => line.part?.values);
  const { winding } = content.circuit;
  const earphone = kinds.find((values) => values?.kind === 'earphone');
  const former = kinds.find((values) => values?.kind === 'coil-former');
  const wire = kinds.find((values) => values?.kind === 'wire');
  const vanes = kinds.find((values) => values?.kind === 'variable-capacitor');
  const pitch = winding.pitch ?? (wire?.kind === 'wire' ? wire.overall : null);
  return {
    coil: 'tube',
    turns: winding.turns,
    taps: [winding.aerialTap, winding.detectorTap].filter((tap) => tap !== null),
    tube:
      former?.kind === 'coil-former' && pitch !== null
        ? {
            length: former.length,
            diameter: former.outerDiameter.nominal,
            wound: Math.min(former.length, pitch * winding.turns),
          }
        : null,
    largest: vanes?.kind === 'variable-capacitor' ? vanes.max.nominal : null,
    tuning: kinds.some((values) => values?.kind === 'foil-capacitor') ? 'foil-plates' : 'vanes',
    earphone: earphone?.kind === 'earphone' && earphone.earphoneKind !== 'ceramic' ? 'headset' : 'earpiece',
  };
}

interface Searchable {
  code: string;
  name: string;
  number: number;
  stations: readonly { name: string; f: number }[];
}

/** A kit is found by its name, code or number, and by a station that its list names, in words or kHz. */
export function matches(kit: Searchable, q: string): boolean {
  const words = q.toLowerCase().split(/\s+/).filter(Boolean);
  const said = [
    kit.code,
    kit.name,
    `no. ${kit.number}`,
    ...kit.stations.flatMap((station) => [station.name, `${Math.round(station.f / 1000)}`]),
  ].map((text) => text.toLowerCase());
  return words.every((word) => said.some((text) => text.includes(word)));
}

/** Cost of a line at what its part costs a piece, a metre or a gram; quantities of the latter are thousandths. */
export function lineCost(line: Pick<FrozenLine, 'quantity' | 'part'>, costMinor: number): number {
  return line.part?.unit === 'each' ? line.quantity * costMinor : (line.quantity * costMinor) / 1000;
}

/** The rail of a version. Its brackets stand at the first and last carrier, which is what a buyer can tune to. */
export function reachOf(verdict: Pick<Verdict, 'reach'> | null, content: Pick<VersionContent, 'kit'>): Reach | null {
  if (!verdict) return null;
  const { firstCarrier, lastCarrier } = content.kit.band;
  return {
    band: { lo: firstCarrier, hi: lastCarrier },
    nominal: verdict.reach.nominal,
    worst: verdict.reach.corners,
  };
}
