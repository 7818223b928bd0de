import { ReachRail } from '@/components/charts/reach-rail';
import { Button } from '@/components/ui/button';
import { Sign } from '@/components/ui/sign';
import type { TriedRemedy } from './verdict-messages';

export interface RemedyCardsProps {
  band: { lo: number; hi: number };
  remedies: readonly TriedRemedy[];
  onTry?: ((remedy: TriedRemedy) => void) | undefined;
}

const count = ['', 'One way', 'Two ways', 'Three ways'];
const kHz = (hertz: number) => Math.round(hertz / 1000);

/** Ways to mend it, each worked out before it is pressed. */
export function RemedyCards({ band, remedies, onTry }: RemedyCardsProps) {
  const mends = remedies.some(({ stops }) => stops.length === 0);
  return (
    <section aria-labelledby="remedies-title">
      <h3 id="remedies-title" className="mb-2 font-bold">
        {mends ? `${count[remedies.length] ?? `${remedies.length} ways`} to mend it` : 'Nothing mends it alone'}{' '}
        <span className="font-normal text-caption text-ink2">
          {mends
            ? 'each worked out with the same tolerances'
            : remedies.length === 1
              ? 'this comes nearest'
              : 'these come nearest; two of them together may do'}
        </span>
      </h3>
      <ul className="grid gap-3 sm:grid-cols-2 lg:grid-cols-3">
        {remedies.map((remedy) => (
          <li
            key={remedy.code + remedy.text}
            className="grid content-start gap-2 rounded-panel border border-rule bg-well/40 p-3"
          >
            <p className="flex gap-2 font-bold">
              <Sign kind={remedy.stops.length === 0 ? 'clears' : 'stops'} size={18} className="mt-0.5 shrink-0" />
              {remedy.text}
            </p>
            {remedy.reach && (
              <>
                <p className="text-caption text-ink2">
                  {`Reaches ${kHz(remedy.reach.nominal.lo)} to ${kHz(remedy.reach.nominal.hi)} kHz.`}
                </p>
                <ReachRail band={band} nominal={remedy.reach.nominal} worst={remedy.reach.corners} size="list" />
              </>
            )}
            {remedy.stops[0] !== undefined && (
              <p className="text-caption font-semibold text-crimson">{remedy.stops[0]}</p>
            )}
            {onTry && (
              <div>
                <Button size="small" onClick={() => onTry(remedy)}>
                  Try it
                </Button>
              </div>
            )}
          </li>
        ))}
      </ul>
    </section>
  );
}
