import { type Letter, letter } from './letter';
import { type OrderMailView, whatWasOrdered } from './order-view';

export const orderBackordered = (view: OrderMailView): Letter =>
  letter(`Order ${view.number} is paid and waits for parts`, view.name, [
    { line: `Order ${view.number} is paid, but the last parts went to somebody else a moment before.` },
    whatWasOrdered(view),
    {
      line: 'We build it as soon as the parts are in. If you would rather not wait, cancel on the order page and the whole amount comes back.',
    },
    { link: view.link, label: 'Wait or cancel' },
  ]);
