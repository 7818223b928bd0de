import { type Letter, letter } from './letter';
import { type OrderMailView, whatWasOrdered } from './order-view';

export const orderShipped = (view: OrderMailView): Letter =>
  letter(`Order ${view.number} is on its way`, view.name, [
    { line: sentence(view) },
    whatWasOrdered(view),
    { link: view.link, label: 'Follow the order' },
    {
      line: 'Check the box against the list in its guide. If a part is missing, say so on the order page and it is sent.',
    },
  ]);

const sentence = ({ number, shipment }: OrderMailView) =>
  shipment
    ? `Order ${number} left the yard with ${shipment.carrier}, tracking number ${shipment.trackingNumber}.`
    : `Order ${number} left the yard.`;
