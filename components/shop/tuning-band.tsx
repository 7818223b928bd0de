import { ReachRail } from '@/components/charts/reach-rail';
import { ReachTable } from '@/components/charts/reach-table';
import type { KitPage } from '@/services/catalogue/schemas';

/** What the kit can tune, the full width of the page, with the stations of its list. */
export function TuningBand({ kit }: { kit: KitPage }) {
  const { reach, stations, contour } = kit;
  if (!reach) return null;
  return (
    <section
      aria-labelledby="what-it-tunes"
      className="mt-6 border-t-2 border-b border-t-ink border-b-rule bg-card py-4.5"
    >
      <div className="mx-auto max-w-page px-4 sm:px-6">
        <div className="mb-3 flex flex-wrap items-baseline gap-x-4.5 gap-y-1">
          <h2 id="what-it-tunes" className="font-display text-section">
            What it can tune
          </h2>
          <p>{stationSentence(stations, reach.worst)}</p>
        </div>
        <ReachRail {...reach} contour={contour} stations={stations} size="front" />
        <div className="mt-2 flex flex-wrap items-baseline justify-between gap-x-6 gap-y-1">
          <p className="text-caption text-ink2">
            Tuning says nothing of strength. What you hear depends on your aerial, your earth and the hour.
          </p>
          <ReachTable {...reach} stations={stations} name={`Reach of ${kit.name}`} />
        </div>
      </div>
    </section>
  );
}

function stationSentence(stations: KitPage['stations'], worst: { lo: number; hi: number }): string {
  if (stations.length === 0) return 'Worked out with every part at its worst tolerance.';
  const inside = stations.filter(({ f }) => f >= worst.lo && f <= worst.hi).length;
  if (inside === stations.length) {
    return stations.length === 1
      ? 'The station on its list sits inside the reach, even with every part at its worst tolerance.'
      : `All ${stations.length} stations on its list sit inside the reach, even with every part at its worst tolerance.`;
  }
  return `${inside} of ${stations.length} stations on its list sit inside the reach with every part at its worst tolerance.`;
}
