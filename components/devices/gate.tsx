import { classes } from '@/components/ui/classes';

export type GateProps = {
  /** The range worked out, in any one unit. */
  lo: number;
  hi: number;
  /** What was read on the bench, in the same unit; null until it is. */
  reading: number | null;
  unit: string;
  /** How the three numbers are written; whole numbers by default. */
  format?: (value: number) => string;
  /** What is measured, for readers: "Lowest frequency". */
  measure: string;
  /** Writes the range under the gate. */
  showRange?: boolean;
  className?: string;
};

const plain = (value: number) => String(value);

/** In words: "Lowest frequency: 788 kHz, inside the gate of 761 to 820 kHz". */
export function gateSentence(props: Omit<GateProps, 'className' | 'showRange'>): string {
  const { lo, hi, reading, unit, format = plain, measure } = props;
  const range = `${format(lo)} to ${format(hi)} ${unit}`;
  if (reading === null) return `${measure}: not read yet, the gate is ${range}.`;
  const where = isInside(lo, hi, reading) ? 'inside' : reading < lo ? 'under' : 'over';
  return `${measure}: ${format(reading)} ${unit}, ${where} the gate of ${range}.`;
}

export const isInside = (lo: number, hi: number, reading: number) => reading >= lo && reading <= hi;

/** Places in a box 170 wide: the gate's posts at 30 and 70 of 100, readings far out held at the ends. */
const POST = { left: 50, right: 120 };

function needleAt(lo: number, hi: number, reading: number): number {
  if (hi <= lo) return (POST.left + POST.right) / 2;
  const x = POST.left + ((reading - lo) / (hi - lo)) * (POST.right - POST.left);
  return Math.round(Math.max(6, Math.min(164, x)) * 10) / 10;
}

export function Gate(props: GateProps) {
  const { lo, hi, reading, format = plain, showRange = false, className } = props;
  const x = reading === null ? null : needleAt(lo, hi, reading);
  return (
    <span className={classes('inline-grid justify-items-center', className)}>
      <svg role="img" aria-label={gateSentence(props)} width="170" height="28" viewBox="0 0 170 28">
        <path d="M0 18H170" className="stroke-edge" />
        <path
          d={`M${POST.left + 5} 10H${POST.left}V26h5M${POST.right - 5} 10h5V26h-5`}
          fill="none"
          className="stroke-copper"
          strokeWidth="2.4"
        />
        {x !== null && reading !== null && <Needle x={x} isIn={isInside(lo, hi, reading)} />}
      </svg>
      {showRange && (
        <span aria-hidden className="font-figures text-axis text-ink2">
          {format(lo)} to {format(hi)}
        </span>
      )}
    </span>
  );
}

function Needle({ x, isIn }: { x: number; isIn: boolean }) {
  return isIn ? (
    <>
      <path d={`M${x} 24V8`} className="stroke-ink" strokeWidth="2.4" />
      <path d={`M${x} 11l-5.500-9h11Z`} className="fill-ink" />
    </>
  ) : (
    <>
      <path d={`M${x} 24V12`} className="stroke-crimson" strokeWidth="2.4" />
      <path d={`M${x - 5} 2l10 9m0-9l-10 9`} className="stroke-crimson" strokeWidth="2.6" />
    </>
  );
}
