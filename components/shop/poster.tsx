import type { KitCard } from '@/services/catalogue/schemas';
import { LinkButton } from '@/components/ui/link-button';
import { formatMoney } from '@/services/money';
import { SvgDrawing } from '@/templates/drawings/as-svg';
import { posterDrawing } from '@/templates/drawings/kit-drawing';
import { lookOf } from './kit-look';

/** The shop's front: what this is, in one sentence and one drawing, and what of it is on sale. */
export function Poster({ kits, newest }: { kits: readonly KitCard[]; newest: KitCard | undefined }) {
  const onSale = onSaleWords(kits);
  const look = newest
    ? lookOf(newest.shape)
    : ({ coil: { form: 'flat', spokes: 11, turns: 9 }, tuning: 'vanes', earphone: 'earpiece' } as const);
  return (
    <section className="ground-plate overflow-hidden">
      <div className="mx-auto grid max-w-page items-center gap-x-6 px-4 sm:px-6 md:grid-cols-[minmax(0,1fr)_minmax(0,1.15fr)]">
        <div className="pt-3 md:order-last md:pt-0">
          <SvgDrawing
            drawing={posterDrawing(look)}
            scheme="plate"
            steadyLines
            className="mx-auto block h-auto max-h-52 w-full sm:max-h-72 md:max-h-102"
          />
        </div>
        <div className="pt-4 pb-6 md:py-10">
          <h1 className="font-display text-poster">Receivers that run on the signal itself.</h1>
          <p className="mt-4 max-w-130 text-lead text-on-enamel2">
            No battery, no charger, no app. You wind the coil; the aerial does the rest. {onSale}
          </p>
          <div className="mt-5 flex flex-col gap-3 sm:flex-row">
            <LinkButton href="#kits" variant="cream" size="big" iconAfter="arrow">
              See the kits
            </LinkButton>
            {newest && (
              <LinkButton href={`/kits/${newest.code}`} variant="outline" size="big">
                The newest, {newest.name}
              </LinkButton>
            )}
          </div>
        </div>
      </div>
    </section>
  );
}

/** "Long wave and medium wave, from £27.00": the bands and the lowest price of what is really on sale. */
function onSaleWords(kits: readonly KitCard[]): string {
  const bands = [...new Set(kits.map((kit) => kit.bandName))].sort();
  const [lowest] = kits.flatMap((kit) => (kit.prices[0] ? [kit.prices[0].unit] : [])).sort((a, b) => a.minor - b.minor);
  const last = bands.at(-1);
  if (last === undefined) return '';
  const named = bands.length > 1 ? `${bands.slice(0, -1).join(', ')} and ${last}` : last;
  const sentence = named.charAt(0).toUpperCase() + named.slice(1);
  return lowest ? `${sentence}, from ${formatMoney(lowest)}.` : `${sentence}.`;
}
