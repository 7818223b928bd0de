import type { PinFit } from '@/templates/drawings/reach-axis';
import type { RailLayout } from '@/templates/drawings/reach-layout';
import type { RailTone } from './rail-tones';

type PinProps = {
  /** Place along the rail, such as "12.5%". */
  at: string;
  fit: PinFit;
  isChosen: boolean;
  pin: RailLayout['pin'];
  tone: RailTone;
};

/** A station: its head is full, half or hollow; the chosen one wears a copper ring. */
export function Pin({ at, fit, isChosen, pin, tone }: PinProps) {
  if (!pin) return null;
  const { top, foot, radius } = pin;
  const head = foot + radius;
  const hollow = Math.max(1.5, radius - 0.6);
  return (
    <svg x={at} overflow="visible" data-fit={fit}>
      <path d={`M0 ${top}V${foot}`} className={tone.pin} strokeWidth="1.3" />
      {fit === 'worst' && <circle cy={head} r={radius} className={tone.pin} stroke="none" strokeWidth="0" />}
      {fit !== 'worst' && <circle cy={head} r={hollow} className={tone.pinHollow} strokeWidth="1.4" />}
      {fit === 'nominal' && (
        <path
          d={`M${-hollow} ${head}A${hollow} ${hollow} 0 0 0 ${hollow} ${head}Z`}
          className={tone.pin}
          strokeWidth="1"
        />
      )}
      {isChosen && <circle cy={head} r={radius + 4.6} fill="none" className={tone.ring} strokeWidth="2.2" />}
    </svg>
  );
}
