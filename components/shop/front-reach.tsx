import Link from 'next/link';
import { ReachRail } from '@/components/charts/reach-rail';
import type { KitPage } from '@/services/catalogue/schemas';
import { kHz } from './words';

/** The newest kit's reach, the full width of the page, on the deep enamel under the poster. */
export function FrontReach({ kit }: { kit: KitPage }) {
  if (!kit.reach) return null;
  const { worst } = kit.reach;
  return (
    <section aria-label={`Reach of ${kit.name}`} className="ground-deep">
      <div className="mx-auto max-w-page px-4 py-4 sm:px-6">
        <div className="mb-2 flex flex-wrap items-baseline gap-x-5 gap-y-1">
          <h2 className="font-display text-panel">
            <Link href={`/kits/${kit.code}`} className="hover:underline">
              {kit.name}, No. {kit.number}
            </Link>
          </h2>
          <p>
            reaches {kHz(worst.lo)} to {kHz(worst.hi)} kHz at worst case
          </p>
          <ul aria-hidden className="ml-auto hidden gap-6 text-caption text-on-deep2 md:flex">
            <li className="flex items-center gap-2">
              <span className="h-3 w-5.5 bg-[#f5efe2]" /> worst case
            </li>
            <li className="flex items-center gap-2">
              <span className="h-3 w-5.5 border-1.5 border-[#f5efe2]" /> nominal
            </li>
            <li className="flex items-center gap-2">
              <span className="h-3.5 w-2 border-3 border-r-0 border-on-enamel-copper" /> the band it is sold for
            </li>
          </ul>
        </div>
        <ReachRail {...kit.reach} contour={kit.contour} stations={kit.stations} size="front" ground="plate" />
      </div>
    </section>
  );
}
