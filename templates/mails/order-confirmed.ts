import { formatMoney } from '@/services/money';
import { type Letter, letter } from './letter';
import { type OrderMailView, whatWasOrdered } from './order-view';

export const orderConfirmed = (view: OrderMailView): Letter =>
  letter(`Order ${view.number} is paid`, view.name, [
    { line: `Order ${view.number} is paid, ${formatMoney(view.total)}. Its parts are set aside for you.` },
    whatWasOrdered(view),
    { link: view.link, label: 'Follow the order' },
    { line: 'The next mail comes when your boxes leave. Until they are packed you can cancel on the order page.' },
  ]);
