import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { accountChanged } from '@/templates/mails/account-changed';
import { invitation } from '@/templates/mails/invitation';
import { noLink } from '@/templates/mails/no-link';
import { orderBackordered } from '@/templates/mails/order-backordered';
import { orderConfirmed } from '@/templates/mails/order-confirmed';
import { orderShipped } from '@/templates/mails/order-shipped';
import { signInLink } from '@/templates/mails/sign-in-link';
import { versionHeld } from '@/templates/mails/version-held';
import { versionReleased } from '@/templates/mails/version-released';

const order = {
  number: 'C-1042',
  name: 'Edda Holm',
  lines: [{ name: 'Harbour set', letter: 'G', quantity: 2, unit: { minor: 3490, currency: 'GBP' } }],
  total: { minor: 7475, currency: 'GBP' },
  link: 'http://127.0.0.1:3000/orders/abc?link=xyz&from=mail',
} as const;
const version = { name: 'Isolde Hark', kitName: 'Harbour set', letter: 'G', link: 'http://yard.example/bench/abc' };

const letters = {
  'sign-in-link': signInLink({ name: 'Edda Holm', link: 'http://yard.example/sign-in/link?token=abc' }),
  'no-link': noLink({ reason: 'no-account', link: 'http://yard.example/join' }),
  invitation: invitation({
    name: 'Bryn Orne',
    roles: ['packer', 'checker'],
    link: 'http://yard.example/invitations/abc',
  }),
  'account-changed': accountChanged({ name: 'Edda Holm', change: 'password', link: 'http://yard.example/sign-in' }),
  'order-confirmed': orderConfirmed(order),
  'order-backordered': orderBackordered(order),
  'order-shipped': orderShipped({ ...order, shipment: { carrier: 'Ferry Post', trackingNumber: 'FP 77 120' } }),
  'version-held': versionHeld({ ...version, remark: 'Short by 80 kHz at the top.' }),
  'version-released': versionReleased({ ...version, remark: '' }),
};

it('a mail about an order gives lines, sums and the way to follow it, in text and HTML alike', () => {
  for (const { text, html } of [letters['order-confirmed'], letters['order-backordered'], letters['order-shipped']]) {
    for (const part of [text, html]) {
      expect(part).toContain('Harbour set, version G');
      expect(part).toContain('£69.80');
      expect(part).toContain('£74.75');
    }
    expect(text).toContain(order.link);
    expect(html).toContain('href="http://127.0.0.1:3000/orders/abc?link=xyz&amp;from=mail"');
  }
  expect(letters['order-shipped'].text).toContain('Ferry Post, tracking number FP 77 120');
});

it('a mail about a held version carries the words of the checker', () => {
  expect(letters['version-held'].text).toContain('Short by 80 kHz at the top.');
  expect(letters['version-released'].text).not.toContain('writes');
});

it('roles in an invitation read as a sentence', () => {
  expect(letters.invitation.text).toContain('as packer and checker.');
});

describe.each(Object.entries(letters))('the mail %s', (_kind, { subject, text, html }) => {
  it('is plain words of the yard: one subject line, signed, no shouting, nothing fetched from elsewhere', () => {
    expect(subject).toMatch(/^[^\r\n]{5,90}$/);
    expect(text).toMatch(/Coilyard\n$/);
    expect(text).not.toMatch(/!|undefined|\[object/);
    expect(html).not.toMatch(/<img|<script|style=|undefined|\[object/);
  });
});

it('whatever a name holds, it stays text in the body and cannot begin a header', () => {
  fc.assert(
    fc.property(fc.string({ unit: 'binary', maxLength: 200 }), (name) => {
      const { subject, html } = versionHeld({ ...version, name, kitName: name, remark: name });
      expect(subject).not.toMatch(/[\r\n\u0000]/);
      const tags = html.match(/<\/?[a-z!]+/gi) ?? [];
      expect(new Set(tags.map((tag) => tag.replace(/[</]/g, '').toLowerCase()))).toEqual(
        new Set(['!doctype', 'html', 'head', 'meta', 'title', 'body', 'p', 'a', 'br']),
      );
    }),
    { numRuns: 1000 },
  );
});
