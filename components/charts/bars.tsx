import { Disclosure } from '@/components/ui/disclosure';
import { Table } from '@/components/ui/table';

export type Bar = {
  /** "Mon 23". */
  name: string;
  value: number;
  /** The same day of the time before: a copper line across. */
  before?: number | undefined;
};

export type BarsProps = {
  bars: readonly Bar[];
  /** One sentence: highest, lowest, and against the time before. */
  sentence: string;
  /** Head of the values in the table, with the unit: "Takings, £". */
  valueHead: string;
  beforeHead?: string;
  nameHead: string;
  /** How a value is written at its bar and in the table. */
  format: (value: number) => string;
};

const HEIGHT = 232;
const FLOOR = 198;
const TOP = 28;
/** Percent of the width left free for the scale. */
const LEFT = 9;

/** Values by day or by kit, with the time before as a line. A zero line; at most four lines over it. */
export function Bars(props: BarsProps) {
  const { bars, sentence, valueHead, beforeHead, nameHead, format } = props;
  const lines = evenLines(Math.max(0, ...bars.flatMap(({ value, before }) => [value, before ?? 0])));
  const most = lines.at(-1) ?? 1;
  const y = (value: number) => Math.round((FLOOR - (Math.max(0, value) / most) * (FLOOR - TOP)) * 10) / 10;
  const slot = (100 - LEFT) / Math.max(1, bars.length);
  const percent = (index: number, within: number) => `${Math.round((LEFT + slot * (index + within)) * 100) / 100}%`;
  return (
    <figure className="min-w-0">
      <svg role="img" aria-label={sentence} width="100%" height={HEIGHT} className="block overflow-visible">
        {lines.map((value) => (
          <g key={value}>
            <line
              x1="40"
              x2="100%"
              y1={y(value)}
              y2={y(value)}
              className="stroke-rule"
              strokeWidth={value === 0 ? 1.6 : 1}
            />
            <text x="34" y={y(value) + 4} textAnchor="end" fontSize="11" className="fill-ink2 font-figures">
              {format(value)}
            </text>
          </g>
        ))}
        {bars.map((bar, index) => (
          <g key={bar.name} textAnchor="middle">
            <rect
              x={percent(index, 0.2)}
              width={`${slot * 0.6}%`}
              y={y(bar.value)}
              height={FLOOR - y(bar.value)}
              className="fill-enamel"
            />
            {bar.before !== undefined && (
              <line
                x1={percent(index, 0.13)}
                x2={percent(index, 0.87)}
                y1={y(bar.before)}
                y2={y(bar.before)}
                className="stroke-copper"
                strokeWidth="3.5"
              />
            )}
            <text
              x={percent(index, 0.5)}
              y={Math.min(y(bar.value), y(bar.before ?? 0)) - 7}
              fontSize="12"
              className="fill-ink font-figures font-semibold"
            >
              {format(bar.value)}
            </text>
            <text x={percent(index, 0.5)} y={FLOOR + 20} fontSize="13" className="fill-ink2 font-text">
              {bar.name}
            </text>
          </g>
        ))}
      </svg>
      <Disclosure summary="Show as table" of={`of ${valueHead}`}>
        <Table
          caption={sentence}
          density="tight"
          columns={[
            { key: 'name', head: nameHead, isRowHead: true, cell: ({ name }: Bar) => name },
            { key: 'value', head: valueHead, figures: true, cell: ({ value }: Bar) => format(value) },
            ...(beforeHead === undefined
              ? []
              : [
                  {
                    key: 'before',
                    head: beforeHead,
                    figures: true,
                    cell: ({ before }: Bar) => (before === undefined ? '' : format(before)),
                  },
                ]),
          ]}
          rows={bars}
          rowKey={({ name }) => name}
        />
      </Disclosure>
    </figure>
  );
}

/** Zero and up to four round values over it. */
function evenLines(most: number): number[] {
  if (most <= 0) return [0, 1];
  const power = 10 ** Math.floor(Math.log10(most / 3));
  const step = ([1, 2, 4, 5, 10, 20].find((factor) => factor * power * 3 >= most) ?? 20) * power;
  return Array.from({ length: Math.ceil(most / step) + 1 }, (_, index) => index * step);
}
