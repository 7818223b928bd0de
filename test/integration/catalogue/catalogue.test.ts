import { beforeAll, describe, expect, it } from 'vitest';
import { type Actor, visitor } from '@/services/access';
import { listOnSale, listPriced, readKitPage, setPrice } from '@/services/catalogue';
import { money } from '@/services/money';
import { reading } from '@/services/record';
import { testDatabase } from '../../builders/database';
import { type BuiltKit, customer, kit, setParts, staff, stockFor } from '../../builders/orders';

testDatabase();
let owner: Actor;
let lamp: BuiltKit;

beforeAll(async () => {
  owner = await staff('Mara Osk', 'owner');
  const packer = await staff('Pia Lund', 'packer');
  const parts = await setParts();
  lamp = await kit({ parts, name: 'Ebb Lamp', number: 7, code: 'EL7', letter: 'B' });
  await stockFor(packer, parts, 14);
  await kit({ name: 'Breakwater', number: 9, code: 'BW9', state: 'held' });
  await kit({ name: 'Old Mill', number: 3, code: 'OM3', state: 'withdrawn' });
  await kit({ name: 'Tollgate', number: 4, code: 'TG4', price: null });
});

describe('the catalogue', () => {
  it('shows released versions only, with reach, price and how many can be made', async () => {
    const { kits } = await listOnSale(visitor);
    expect(kits.map((card) => card.name).sort()).toEqual(['Ebb Lamp', 'Tollgate']);
    const card = kits.find((one) => one.name === 'Ebb Lamp');
    expect(card).toMatchObject({ number: 7, letter: 'B', ready: 14, bandName: 'medium wave' });
    expect(card?.prices).toEqual([{ fromQuantity: 1, unit: money(3800, 'GBP') }]);
    expect(card?.reach?.band).toEqual({ lo: 531_000, hi: 1_602_000 });
    expect(card?.reach?.worst.lo).toBeGreaterThan(card?.reach?.nominal.lo ?? 0);
  });

  it('finds a kit by its name, its code and a station that it reaches', async () => {
    for (const q of ['ebb', 'EL7', 'cape', '1593']) {
      expect((await listOnSale(visitor, { q })).kits.length, q).toBeGreaterThan(0);
    }
    expect((await listOnSale(visitor, { q: 'green coil' })).kits).toEqual([]);
  });

  it('a kit page tells what is in the box and how it was checked; a held kit has none', async () => {
    const page = await readKitPage(visitor, 'el7');
    expect(page.box.map((item) => item.reference)).toEqual(['L1', 'W1', 'C1', 'C2', 'D1', 'R1', 'E1', 'A1']);
    expect(page.check).toMatchObject({ by: 'Walter Tarrow', contentHash: lamp.contentHash });
    expect(page.cautions).toHaveLength(9);
    expect(page.contour?.f.length).toBeGreaterThan(5);
    await expect(readKitPage(visitor, 'BW9')).rejects.toMatchObject({ kind: 'missing' });
    await expect(readKitPage(visitor, 'OM3')).rejects.toMatchObject({ kind: 'missing' });
  });

  it('shows the version that was released last', async () => {
    const parts = await setParts();
    await kit({ kitId: lamp.kitId, number: 7, code: 'EL7', name: 'Ebb Lamp', letter: 'C', parts });
    expect((await readKitPage(visitor, 'EL7')).letter).toBe('C');
  });

  it('sells nothing whose frozen text was changed behind our back', async () => {
    const broken = await kit({ name: 'Long Meadow', number: 11, code: 'LM11' });
    await reading().schema.raw('drop trigger versions_frozen');
    const content = JSON.stringify({ ...broken.content, letter: 'Y' });
    await reading()('versions').where({ id: broken.versionId }).update({ content });
    await expect(readKitPage(visitor, 'LM11')).rejects.toThrow('no longer matches its hash');
    const names = (await listOnSale(visitor)).kits.map((card) => card.name);
    expect(names).toContain('Ebb Lamp');
    expect(names).not.toContain('Long Meadow');
    await reading()('versions').where({ id: broken.versionId }).update({ state: 'withdrawn' });
  });
});

describe('prices', () => {
  it('are set by the owner alone, recorded, and shown at once', async () => {
    const { kitId } = (await listPriced(owner)).find((one) => one.code === 'TG4')!;
    const steps = [
      { fromQuantity: 1, unit: money(2490, 'GBP') },
      { fromQuantity: 10, unit: money(2240, 'GBP') },
    ];
    for (const actor of [visitor, await customer('Ann Tarrant'), await staff('Pia Lund', 'packer')]) {
      await expect(setPrice(actor, { kitId, steps })).rejects.toMatchObject({ kind: 'forbidden' });
    }
    await setPrice(owner, { kitId, steps });
    expect((await readKitPage(visitor, 'TG4')).prices).toEqual(steps);
    const change = await reading()('changes').where({ action: 'price.set' }).first('actor_name', 'before', 'after');
    expect(change).toMatchObject({ actor_name: 'Mara Osk', before: '[]' });
    await expect(setPrice(owner, { kitId, steps: [{ fromQuantity: 1, unit: money(2490, 'EUR') }] })).rejects.toThrow(
      'GBP',
    );
  });
});
