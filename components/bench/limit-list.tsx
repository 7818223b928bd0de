import { fieldOf } from '@/services/kits/rules';
import type { Verdict } from '@/services/receiver';

/** Shares under this say nothing. */
const LEAST = 0.02;
const MOST_ROWS = 5;

/** What limits the reach: whose tolerance makes how much of the spread, at each end. */
export function LimitList({ limits }: { limits: Verdict['limits'] }) {
  const rows = limits.filter(({ share }) => share >= LEAST).slice(0, MOST_ROWS);
  if (rows.length === 0) return null;
  return (
    <section aria-labelledby="limits-title" className="border-t-2 border-ink pt-3">
      <h3 id="limits-title" className="font-display text-panel">
        What limits it
      </h3>
      <p className="mb-2 text-caption text-ink2">Share of the spread that each tolerance makes.</p>
      <dl className="grid grid-cols-[minmax(0,1fr)_minmax(5rem,14rem)_4rem] items-center gap-x-4 gap-y-2">
        {rows.map(({ path, end, share }) => (
          <div key={`${path} ${end}`} className="contents">
            <dt>
              {wordsOf(path)} <span className="text-caption text-ink2">{end === 'lo' ? 'low end' : 'high end'}</span>
            </dt>
            <dd aria-hidden>
              <svg width="100%" height="12" className="block">
                <rect width="100%" height="12" rx="2" className="fill-well" />
                <rect width={`${Math.round(share * 1000) / 10}%`} height="12" rx="2" className="fill-enamel" />
              </svg>
            </dd>
            <dd className="text-right font-figures font-semibold">{Math.round(share * 100)} %</dd>
          </div>
        ))}
      </dl>
    </section>
  );
}

const exact: Record<string, string> = {
  'coil.lFactor': 'Winding by hand',
  'coil.formerDiameter': 'Diameter of the former',
  'tuning.min': 'Least capacitance',
  'tuning.max': 'Largest capacitance',
  'coupling.c': 'Coupling capacitor',
  'aerial.siteFactor': 'Aerial at its place',
  'earth.r': 'Earth',
  stray: 'Stray capacitance',
};

function wordsOf(path: string): string {
  const known = exact[path];
  if (known !== undefined) return known;
  const field = fieldOf(path);
  const words = field.kind === 'place' ? field.place : field.kind === 'circuit' ? field.setting : path;
  return words.charAt(0).toLocaleUpperCase('en-GB') + words.slice(1);
}
