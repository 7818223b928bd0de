import { beforeAll, describe, expect, it } from 'vitest';
import { visitor } from '@/services/access';
import { listOnSale, readKitPage, setPrice } from '@/services/catalogue';
import { hold, readSheet, release, sendToCheck, withdraw } from '@/services/check';
import { newId, type VersionId } from '@/services/ids';
import { readVersion, startVersion } from '@/services/kits';
import { findingKey, notesIn } from '@/services/kits/rules';
import { changeBasket, placeOrder, setDelivery } from '@/services/orders';
import { receiveLot } from '@/services/stock';
import { testDatabase } from '../builders/database';
import { problemOf } from '../builders/problems';
import { aVersion, addSomeParts, partIdOf, someParts, someStaff } from '../builders/versions';

// Invariant 1: nothing that is sold, packed or printed names a version that is not released.
const db = testDatabase();
type Staff = Awaited<ReturnType<typeof someStaff>>;
let isolde: Staff;
let walter: Staff;
let maud: Staff;

beforeAll(async () => {
  isolde = await someStaff(db.sql, 'Isolde Hark', ['designer']);
  walter = await someStaff(db.sql, 'Walter Tarrow', ['checker']);
  maud = await someStaff(db.sql, 'Maud Orrin', ['owner']);
  await addSomeParts(isolde);
  await setDelivery(maud, {
    methods: [
      {
        code: 'letter',
        name: 'By letter post',
        promise: '2 to 3 working days',
        countries: ['GB'],
        price: { minor: 390, currency: 'GBP' },
      },
    ],
  });
  for (const [index, { code }] of someParts.entries()) {
    await receiveLot(maud, {
      partId: await partIdOf(isolde, code),
      lotCode: `LOT-${code}`,
      supplier: 'Pellstow Radio Stores',
      binCode: `A-${index + 1}`,
      quantity: 400_000,
      unitCostMinor: 10,
      accepted: true,
    });
  }
});

const sent = async () => {
  const { view, kitId } = await aVersion().saved(isolde);
  const inCheck = await sendToCheck(isolde, { versionId: view.id, basedOn: view.saveNo });
  await setPrice(maud, { kitId, steps: [{ fromQuantity: 1, unit: { minor: 5800, currency: 'GBP' } }] });
  return inCheck;
};
const released = async (id: VersionId) => {
  const sheet = await readSheet(walter, id);
  const reasons = Object.fromEntries(notesIn(sheet.findings).map((note) => [findingKey(note), 'Right for this kit.']));
  return release(walter, { versionId: id, contentHash: sheet.contentHash, reasons });
};
const order = (basketId: string) =>
  placeOrder(visitor, {
    basketId,
    email: 'edda@hollin-road.example',
    name: 'Edda Holm',
    address: { line1: '7 Ferry Row', line2: '', town: 'Pellstow', postcode: 'PW1 7FR', country: 'GB' },
    deliveryCode: 'letter',
    giftNote: '',
  });

describe('a version that is not released', () => {
  it('cannot be put into a basket as a draft, in check, held or withdrawn, and no catalogue page shows it', async () => {
    const { view: draft } = await aVersion().saved(isolde);
    const inCheck = await sent();
    const toHold = await sent();
    await hold(walter, { versionId: toHold.id, contentHash: toHold.contentHash ?? '', remark: 'More turns, please.' });
    const toWithdraw = await sent();
    await released(toWithdraw.id);
    await withdraw(maud, { versionId: toWithdraw.id, reason: 'The capacitor is no longer made.' });

    for (const { id, content } of [draft, inCheck, toHold, toWithdraw]) {
      const refusal = await problemOf(changeBasket(visitor, { basketId: newId(), versionId: id, quantity: 1 }));
      expect(refusal.kind).toBe('refused');
      expect((await problemOf(readKitPage(visitor, content.kit.code))).kind).toBe('missing');
      const { kits } = await listOnSale(visitor);
      expect(kits.map((kit) => kit.versionId)).not.toContain(id);
    }
    expect(await db.sql('basket_lines')).toEqual([]);
  });

  it('is not ordered when it was withdrawn after it was put into the basket', async () => {
    const version = await sent();
    await released(version.id);
    const basketId = newId();
    await changeBasket(visitor, { basketId, versionId: version.id, quantity: 1 });
    await withdraw(maud, { versionId: version.id, reason: 'The capacitor is no longer made.' });
    expect((await problemOf(order(basketId))).kind).toBe('refused');
    expect(await db.sql('order_lines')).toEqual([]);
  });

  it('does not take the place of the released one while it is drawn or checked', async () => {
    const first = await sent();
    await released(first.id);
    const { versionId } = await startVersion(isolde, { kitId: first.kitId, fromVersionId: first.id });
    const next = await readVersion(isolde, versionId);
    await sendToCheck(isolde, { versionId, basedOn: next.saveNo });
    expect((await readKitPage(visitor, first.content.kit.code)).letter).toBe('A');
    const basketId = newId();
    await changeBasket(visitor, { basketId, versionId: first.id, quantity: 1 });
    await order(basketId);
    expect(await db.sql('order_lines').select('version_id')).toEqual([{ version_id: first.id }]);
  });
});
