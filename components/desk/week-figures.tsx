import type { Today } from '@/services/desk/schemas';
import { formatMoney } from '@/services/money';
import { showDate } from '@/services/time';

/** Four figures of the last seven days, on enamel. */
export function WeekFigures({ today }: { today: Today }) {
  const { figures, at } = today;
  const rows = [
    { figure: formatMoney(figures.week), words: `taken in seven days, ${formatMoney(figures.today)} of it today` },
    { figure: `${figures.boxesSent}`, words: figures.boxesSent === 1 ? 'box sent' : 'boxes sent' },
    {
      figure: figures.hoursToSend === null ? '–' : hours(figures.hoursToSend),
      words: figures.hoursToSend === null ? 'nothing sent in seven days' : 'median, paid to sent',
    },
    {
      figure: formatMoney(figures.refunded),
      words: `paid back, ${figures.refundedOrders} ${figures.refundedOrders === 1 ? 'order' : 'orders'}`,
    },
  ];
  return (
    <div className="ground-plate">
      <div className="mx-auto grid max-w-desk grid-cols-2 gap-y-4 px-4 py-5 sm:px-6 lg:grid-cols-[1.35fr_repeat(4,1fr)]">
        <div className="max-lg:col-span-2">
          <h1 className="font-display text-page">Today</h1>
          <p className="text-on-enamel2">{showDate(at)}</p>
        </div>
        {rows.map(({ figure, words }) => (
          <p key={words} className="border-plate-line pr-4 lg:border-l lg:pl-5">
            <span className="block font-figures text-[25px] leading-8 font-semibold sm:text-total">{figure}</span>
            <span className="text-on-enamel2">{words}</span>
          </p>
        ))}
      </div>
    </div>
  );
}

const hours = (value: number) => (value < 72 ? `${Math.round(value)} h` : `${Math.round(value / 24)} days`);
