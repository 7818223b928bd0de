import { Bars } from '@/components/charts/bars';
import { Panel } from '@/components/ui/panel';
import type { Today } from '@/services/desk/schemas';
import { formatMoney, money } from '@/services/money';

export function Takings({ today }: { today: Today }) {
  const { days } = today;
  const best = days.reduce((top, day) => (day.takings.minor > top.takings.minor ? day : top), days[0] ?? none);
  const all = days.reduce((sum, day) => sum + day.takings.minor, 0);
  const before = days.reduce((sum, day) => sum + day.before.minor, 0);
  return (
    <Panel ground="open" title="Takings by day" note="pounds; the copper line is the week before">
      <Bars
        sentence={
          all === 0
            ? 'Nothing was taken in the last seven days.'
            : `Most on ${best.label}, ${formatMoney(best.takings)}. ${formatMoney(money(all, 'GBP'))} in all, against ${formatMoney(money(before, 'GBP'))} the week before.`
        }
        nameHead="Day"
        valueHead="Takings, £"
        beforeHead="The week before, £"
        format={(value) => (Number.isInteger(value) ? value.toString() : value.toFixed(2))}
        bars={days.map((day) => ({ name: day.label, value: day.takings.minor / 100, before: day.before.minor / 100 }))}
      />
    </Panel>
  );
}

const none = { label: '', takings: money(0, 'GBP'), before: money(0, 'GBP') };
