import { describe, expect, it } from 'vitest';
import {
  deliveriesTo,
  fulfilmentMayBecome,
  headlineOf,
  mayCancel,
  paymentAfter,
  paymentMayBecome,
  postcodeWarning,
  timelineOf,
  type Facts,
} from '@/services/orders/rules';
import { FulfilmentState, PaymentState, PlaceOrder } from '@/services/orders/schemas';
import { newId } from '@/services/ids';

const facts: Facts = {
  payment: 'paid',
  fulfilment: 'picking',
  paidAt: 1000,
  pickedAt: null,
  packedAt: null,
  shippedAt: null,
  promise: '2 to 3 working days',
  boxes: { all: 2, closed: 0 },
  tracking: null,
};

describe('the timeline of an order', () => {
  it('stands at the last stage that is done', () => {
    const stages = timelineOf({ ...facts, pickedAt: 2000, packedAt: 3000 });
    expect(stages.map((stage) => stage.state)).toEqual(['done', 'done', 'now', 'waiting', 'waiting']);
  });

  it('waits at the start until it is paid', () => {
    expect(timelineOf({ ...facts, paidAt: null }).every((stage) => stage.state === 'waiting')).toBe(true);
  });

  it('counts the boxes that are closed', () => {
    const packed = timelineOf({ ...facts, boxes: { all: 2, closed: 1 } })[2];
    expect(packed?.note).toBe('1 of 2 boxes closed');
  });
});

describe('states of an order', () => {
  it('a paid order never goes back to waiting for payment', () => {
    for (const from of PaymentState.options) expect(paymentMayBecome(from, 'awaiting-payment')).toBe(false);
  });

  it('what is cancelled stays cancelled', () => {
    for (const to of FulfilmentState.options) expect(fulfilmentMayBecome('cancelled', to)).toBe(false);
    for (const to of PaymentState.options) expect(paymentMayBecome('cancelled', to)).toBe(false);
  });

  it('can be cancelled until a packer begins', () => {
    const cancellable = FulfilmentState.options.filter((fulfilment) => mayCancel({ payment: 'paid', fulfilment }));
    expect(cancellable).toEqual(['placed', 'allocated', 'backordered']);
    expect(mayCancel({ payment: 'refunded', fulfilment: 'allocated' })).toBe(false);
  });

  it('follow the money that came and went', () => {
    expect(paymentAfter(0, 0)).toBe('awaiting-payment');
    expect(paymentAfter(3800, 0)).toBe('paid');
    expect(paymentAfter(3800, 1)).toBe('part-refunded');
    expect(paymentAfter(3800, 3800)).toBe('refunded');
  });

  it('each have a sentence that heads the page', () => {
    for (const payment of PaymentState.options) {
      for (const fulfilment of FulfilmentState.options) {
        const { headline, lead } = headlineOf({ ...facts, payment, fulfilment });
        expect(`${headline} ${lead}`).toMatch(/^[A-Z].*\.$/);
        expect(headline.startsWith('Cancelled')).toBe(fulfilment === 'cancelled');
      }
    }
  });
});

describe('an address', () => {
  const order = {
    basketId: newId(),
    email: 'ann@example.org',
    name: 'Ann Tarrant',
    address: { line1: '3 Quay Street', town: 'Pellstow', country: 'GB' },
    deliveryCode: 'parcel',
  };

  it('may do without a postcode, a second line and a gift note', () => {
    expect(PlaceOrder.safeParse(order).success).toBe(true);
  });

  it('keeps letters of any script', () => {
    const address = { ...order.address, line1: 'Ærøgade 4', town: 'Łódź' };
    expect(PlaceOrder.parse({ ...order, address }).address).toMatchObject(address);
  });

  it('is refused with a line break, which no label prints', () => {
    const address = { ...order.address, line1: '3 Quay Street\nBcc: all' };
    expect(PlaceOrder.safeParse({ ...order, address }).success).toBe(false);
  });

  it('is reached by e-mail at one address only', () => {
    for (const email of ['a@b.org,c@d.org', 'a b@c.org', '"a"@b.org', 'a@@b.org', 'a@b', 'a@b.org\r\nBcc: x@y.org']) {
      expect(PlaceOrder.safeParse({ ...order, email }).success, email).toBe(false);
    }
  });

  it('gets a warning, never a refusal, for an odd postcode', () => {
    expect(postcodeWarning('GB', 'pl3 4rt')).toBeNull();
    expect(postcodeWarning('GB', '12345')).toContain('Keep it if it is right');
    expect(postcodeWarning('IE', 'anything')).toBeNull();
  });

  it('is served by the ways of sending that name its country, else by those for everywhere', () => {
    const methods = [
      { code: 'parcel', countries: ['GB'] },
      { code: 'abroad', countries: ['*'] },
    ];
    expect(deliveriesTo(methods, 'GB').map((method) => method.code)).toEqual(['parcel']);
    expect(deliveriesTo(methods, 'NO').map((method) => method.code)).toEqual(['abroad']);
  });
});
