import Link from 'next/link';
import { ReachRail } from '@/components/charts/reach-rail';
import { Sign } from '@/components/ui/sign';
import type { KitCard as Kit } from '@/services/catalogue/schemas';
import { formatMoney } from '@/services/money';
import { SvgDrawing } from '@/templates/drawings/as-svg';
import { cardDrawing } from '@/templates/drawings/kit-drawing';
import { lookOf } from './kit-look';
import { ReadyWords } from './ready-words';

/** A kit in the catalogue. The whole card leads to its page; its name is the link that readers hear. */
export function KitCard({ kit, level = 3 }: { kit: Kit; level?: 2 | 3 }) {
  const Heading = `h${level}` as const;
  const price = kit.prices[0]?.unit;
  return (
    <li className="relative flex flex-col overflow-hidden rounded-panel border border-rule bg-card focus-within:outline-3 focus-within:outline-offset-2 focus-within:outline-enamel hover:border-ink">
      <div className="relative border-b border-rule bg-well px-3 pt-2.5">
        <p className="absolute font-figures text-caption font-semibold">No. {kit.number}</p>
        <SvgDrawing drawing={cardDrawing(lookOf(kit.shape))} className="mx-auto block h-37.5 w-full" />
      </div>
      <div className="flex flex-1 flex-col px-4 pt-3 pb-4">
        <div className="flex items-baseline justify-between gap-3">
          <Heading className="font-display text-panel">
            <Link href={`/kits/${kit.code}`} className="outline-none after:absolute after:inset-0">
              {kit.name}
            </Link>
          </Heading>
          {price && <b className="font-figures text-value whitespace-nowrap">{formatMoney(price)}</b>}
        </div>
        <p className="mt-1 mb-3 text-caption">{kit.summary}</p>
        <div className="mt-auto">
          {kit.reach && <ReachRail {...kit.reach} stations={kit.stations} size="card" />}
          <p className="mt-3 flex items-center gap-2 text-caption font-semibold text-pine">
            <Sign kind="clears" size={16} />
            <span>
              Released, version{' '}
              <span className="font-figures">
                {kit.number}&#8239;{kit.letter}
              </span>
            </span>
          </p>
          <ReadyWords ready={kit.ready} isPriced={price !== undefined} />
        </div>
      </div>
    </li>
  );
}
