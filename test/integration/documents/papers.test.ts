import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Actor } from '@/services/access';
import { type PaperKind, type PaperSize } from '@/services/documents/schemas';
import { readGuidePage, renderPaper } from '@/services/documents';
import { BoxId, newId } from '@/services/ids';
import { cautions } from '@/services/kits/cautions';
import { claimBox, closeBox, markPrinted, prepareBoxes, readBox, scan, weigh } from '@/services/packing';
import { canonicalJson, now, reading } from '@/services/record';
import { type Millrace, millrace, paidOrder, stocked } from '@/test/builders/boxes';
import { testDatabase } from '@/test/builders/database';
import { customer, staff } from '@/test/builders/orders';

testDatabase();
const folder = mkdtempSync(join(tmpdir(), 'coilyard-papers-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

let packer: Extract<Actor, { kind: 'staff' }>;
let kit: Millrace;
let boxId: BoxId;
let orderId: string;
let key: string;
let serial: string;
let guideCode: string;

beforeAll(async () => {
  packer = await staff('Bo Orne', 'packer');
  kit = await millrace();
  const lots = await stocked(packer, kit, 6);
  ({ orderId, linkKey: key } = await paidOrder(kit, 2, { giftNote: 'For the long evenings, from the whole club.' }));
  await prepareBoxes(packer);
  const first = await reading()('boxes').where('order_id', orderId).orderBy('position').first<{ id: string }>('id');
  boxId = BoxId.parse(first?.id);
  await claimBox(packer, { boxId });
  for (const place of (await readBox(packer, boxId)).places) {
    const pieces = place.unit === 'each' ? place.needed : 1;
    await scan(packer, { boxId, code: lots.get(place.partCode) ?? '', pieces });
  }
  const box = await readBox(packer, boxId);
  serial = box.serial;
  guideCode = box.guide.code;
  await scan(packer, { boxId, code: guideCode });
  await weigh(packer, { boxId, milligrams: box.mass.expected + 4000 });
  await markPrinted(packer, { boxId, paper: 'slip' });
  await closeBox(packer, { boxId });
});

/** Prints a paper and looks at the file with tools that are not ours. */
async function printed(kind: PaperKind, size: PaperSize = 'a4', id: string = boxId) {
  const { bytes, filename, contentType } = await renderPaper(packer, { kind, id, size });
  const file = join(folder, `${kind}-${size}.pdf`);
  writeFileSync(file, bytes);
  const run = (tool: string, ...args: string[]) => execFileSync(tool, args, { encoding: 'utf8' });
  return {
    filename,
    contentType,
    info: run('pdfinfo', file),
    fonts: run('pdffonts', file)
      .split('\n')
      .slice(2)
      .filter((row) => row !== ''),
    images: run('pdfimages', '-list', file)
      .split('\n')
      .slice(2)
      .filter((row) => row !== ''),
    // Line ends of the setting are no part of the words.
    text: run('pdftotext', '-layout', file, '-').replace(/\s+/g, ' '),
    inOrder: run('pdftotext', '-raw', file, '-').replace(/\s+/g, ' '),
    raw: Buffer.from(bytes).toString('latin1'),
  };
}

describe('every paper', () => {
  it.each([
    ['slip', 'a4', '595.28 x 841.89 pts (A4)'],
    ['slip', 'letter', '612 x 792 pts (letter)'],
    ['guide', 'a4', '595.28 x 841.89 pts (A4)'],
    ['guide', 'letter', '612 x 792 pts (letter)'],
    ['label', 'a4', '175.748 x 283.465 pts'],
  ] as const)(
    '%s on %s has its size, title, language and author, and its faces in the file',
    async (kind, size, page) => {
      const paper = await printed(kind, size);
      expect(paper.contentType).toBe('application/pdf');
      expect(paper.info).toContain(`Page size:       ${page}`);
      expect(paper.info).toMatch(/Title: +(Packing slip|Build guide|Box label)/);
      expect(paper.info).toMatch(/Author: +Coilyard/);
      expect(paper.raw).toContain('/Lang (en-GB)');
      expect(paper.fonts.length).toBeGreaterThan(3);
      for (const row of paper.fonts) expect(row, row).toMatch(/ yes yes yes +\d/);
      expect(paper.images).toEqual([]);
    },
  );

  it('names the box and the first eight characters of its content', async () => {
    for (const kind of ['slip', 'guide', 'label'] as const) {
      const { text } = await printed(kind);
      expect(text).toContain(serial);
      expect(text).toContain(kit.contentHash.slice(0, 8).toUpperCase());
    }
  });

  it('keeps every digit, whatever was printed before it', async () => {
    const view = await readGuidePage(packer, { boxId });
    await printed('slip');
    const guide = await printed('guide');
    for (const row of view.windingRows) expect(guide.text).toContain(row.value);
  });
});

describe('packing slip', () => {
  it('lists every line with its pieces, bin and time, and no price', async () => {
    const { text, info, filename } = await printed('slip');
    expect(info).toMatch(/Pages: +1\n/);
    expect(filename).toBe(`slip-${serial}.pdf`);
    for (const line of kit.content.lines) {
      if (!line.part || line.place === 'packaging' || line.place === 'print') continue;
      expect(text).toContain(`${line.reference} ${line.part.name}`);
    }
    expect(text).toContain('Printed guide for 4 F');
    expect(text).toContain('All pieces 17');
    expect(text).toContain('Osk Bridge, OB4 2HR');
    expect(text).toContain('For the long evenings, from the whole club.');
    expect(text).toContain('by Bo Orne');
    expect(text).not.toMatch(/[£€$]|38\.00/);
  });
});

it('a name with letters of other Latin alphabets is printed from faces in the file', async () => {
  const { orderId: abroad } = await paidOrder(kit, 1, { name: 'Łucja Ďurková-Győry' });
  await prepareBoxes(packer);
  const row = await reading()('boxes').where('order_id', abroad).first<{ id: string }>('id');
  const slip = await printed('slip', 'a4', row?.id ?? '');
  expect(slip.text).toContain('Łucja Ďurková-Győry');
  for (const font of slip.fonts) expect(font, font).toMatch(/ yes yes yes +\d/);
});

describe('build guide', () => {
  it('says everything that the version says, cautions before parts before steps', async () => {
    const { inOrder, text } = await printed('guide');
    const { guide, lines } = kit.content;
    for (const code of guide.cautions) expect(inOrder).toContain(cautions[code].title);
    for (const step of guide.steps) expect(inOrder).toContain(step.title);
    for (const line of lines)
      if (line.part && !['packaging', 'print'].includes(line.place)) expect(text).toContain(line.reference);
    const order = [
      'Cautions first',
      'What is in the box',
      'The coil',
      'The circuit',
      'Lay out the parts',
      'Connect and listen',
      'If it stays silent',
    ];
    const places = order.map((words) => inOrder.indexOf(words));
    expect(places.every((place) => place > 0)).toBe(true);
    expect(places).toEqual([...places].sort((a, b) => a - b));
    expect(text).toContain('Local codes and licensed practice rule.');
    expect(text).toContain(guideCode);
  });

  it('tells how to recognise each marked part', async () => {
    const { text } = await printed('guide');
    expect(text).toContain('bands yellow, violet, orange, gold');
    expect(text).toContain('marked 100');
  });

  it('gives turns, taps and wire as lengths, and the reading to check them by', async () => {
    const { text } = await printed('guide');
    // 60 turns on 63.44 mm at a pitch of 0.4532 mm, two ends of 15 cm and one tap loop of 8 cm.
    const whole = 60 * Math.hypot(Math.PI * 0.06344, 1.03 * 0.00044) + 0.3 + 0.08;
    const toTap = 40 * Math.hypot(Math.PI * 0.06344, 1.03 * 0.00044) + 0.15;
    expect(text).toContain(`End 60 ${whole.toFixed(2)} m`);
    expect(text).toContain(`Detector tap 40 ${toTap.toFixed(2)} m`);
    expect(text).toMatch(/Start to end on a meter 1\.\d to \d\.\d Ω/);
  });

  it('prints on each sheet the version it is made for and its place among the pages', async () => {
    const { text, info } = await printed('guide');
    const pages = Number(/Pages: +(\d+)/.exec(info)?.[1]);
    expect(text.match(/Made for version 4 F only/g)).toHaveLength(pages);
    expect(text).toContain(`${pages} / ${pages}`);
  });

  it('a version with many steps and parts runs on without losing a line', async () => {
    const long = await millrace({
      code: 'LONG',
      number: 99,
      change: (content) => ({
        ...content,
        guide: {
          ...content.guide,
          steps: Array.from({ length: 30 }, (_, index) => ({
            title: `Step of number ${index + 1}`,
            text: `${'Do this with care and look at it again. '.repeat(28)}End of ${index + 1}.`,
            uses: ['L1', 'W1'],
            check: 'Look at it once more, from the other side, before you go on.'.repeat(4),
          })),
        },
      }),
    });
    const order = await paidOrder(long, 1);
    await prepareBoxes(packer);
    const row = await reading()('boxes').where('order_id', order.orderId).first<{ id: string }>('id');
    const { inOrder } = await printed('guide', 'letter', row?.id ?? '');
    for (let step = 1; step <= 30; step++) expect(inOrder).toContain(`End of ${step}.`);
  });
});

describe('who may have a paper', () => {
  it('the buyer opens the guide of an own box, by account or by the link, and no slip', async () => {
    const buyer = await customer('Edda Rill');
    const other = await customer('Tam Sallow');
    await reading()('orders').where('id', orderId).update({ customer_id: buyer.id });
    expect((await renderPaper(buyer, { kind: 'guide', id: boxId })).filename).toBe(`guide-${serial}.pdf`);
    expect((await readGuidePage(buyer, { boxId })).serial).toBe(serial);
    await expect(renderPaper(buyer, { kind: 'slip', id: boxId })).rejects.toMatchObject({ kind: 'missing' });
    await expect(renderPaper(other, { kind: 'guide', id: boxId })).rejects.toMatchObject({ kind: 'missing' });
    await expect(readGuidePage(other, { boxId })).rejects.toMatchObject({ kind: 'missing' });
    expect((await renderPaper({ kind: 'visitor' }, { kind: 'guide', id: boxId, key })).bytes.length).toBeGreaterThan(
      1000,
    );
    await expect(renderPaper({ kind: 'visitor' }, { kind: 'guide', id: boxId, key: 'guessed' })).rejects.toMatchObject({
      kind: 'missing',
    });
    await expect(renderPaper({ kind: 'visitor' }, { kind: 'guide', id: boxId })).rejects.toMatchObject({
      kind: 'missing',
    });
  });

  it('an id that is none gives the same answer as one that is somebody else’s', async () => {
    const stranger = await customer('Wim Tarn');
    const answers = await Promise.all(
      [boxId, newId(), '../../etc/passwd', 'http://127.0.0.1/x'].map((id) =>
        renderPaper(stranger, { kind: 'guide', id }).catch((error: unknown) => error),
      ),
    );
    for (const answer of answers) expect(answer).toMatchObject({ kind: 'missing' });
  });

  it('a version whose content was changed behind the product is not printed', async () => {
    const bent = await millrace({ code: 'BENT', number: 77 });
    const order = await paidOrder(bent, 1);
    await prepareBoxes(packer);
    const row = await reading()('boxes').where('order_id', order.orderId).first<{ id: string }>('id');
    await reading().raw('drop trigger versions_frozen');
    await reading()('versions')
      .where('id', bent.versionId)
      .update({ content: canonicalJson({ ...bent.content, letter: 'Z' }) });
    await expect(renderPaper(packer, { kind: 'guide', id: row?.id ?? '' })).rejects.toThrow(
      /no longer matches its hash/,
    );
  });

  it('a withdrawn version stays readable on an old box, and says so', async () => {
    await reading()('versions').where('id', kit.versionId).update({ state: 'withdrawn' });
    try {
      expect((await printed('guide')).text).toContain('This version was withdrawn after your box was packed.');
      await reading()('versions').where('id', kit.versionId).update({ state: 'held' });
      await expect(renderPaper(packer, { kind: 'guide', id: boxId })).rejects.toThrow(/not released/);
    } finally {
      await reading()('versions').where('id', kit.versionId).update({ state: 'released' });
    }
  });
});

it('an invoice prints what was issued, to the penny', async () => {
  const owner = await staff('Maud Orrin', 'owner');
  const id = newId();
  const gbp = (minor: number) => ({ minor, currency: 'GBP' as const });
  const content = {
    number: 12,
    issuedAt: now(),
    order: { number: 'Y-4101', placedAt: now(), paidAt: now() },
    seller: { name: 'Coilyard', lines: ['The Old Ropery'], country: 'GB', taxId: 'GB 000 0041 27' },
    buyer: {
      name: 'Hollin Road Radio Club',
      email: 'club@example.org',
      address: { line1: 'The Old Drill Hall', line2: '', town: 'Osk Bridge', postcode: 'OB4 2HR', country: 'GB' },
    },
    lines: [{ name: 'Millrace', letter: 'F', quantity: 2, unit: gbp(3800), total: gbp(7600) }],
    delivery: { name: 'Parcel', price: gbp(450) },
    taxBasisPoints: 2000,
    net: gbp(6708),
    tax: gbp(1342),
    total: gbp(8050),
  };
  await reading()('invoices').insert({
    id,
    number: 12,
    order_id: orderId,
    issued_at: now(),
    content: canonicalJson(content),
  });
  const { bytes, filename } = await renderPaper(owner, { kind: 'invoice', id, size: 'letter' });
  const file = join(folder, 'invoice.pdf');
  writeFileSync(file, bytes);
  const text = execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' }).replace(/\s+/g, ' ');
  expect(filename).toBe('invoice-12.pdf');
  expect(text).toContain('Millrace, receiver kit, version F 2 £38.00 £76.00');
  expect(text).toContain('Without tax £67.08');
  expect(text).toContain('Tax, 20 % £13.42');
  expect(text).toContain('Total, tax included £80.50');
  await expect(renderPaper(packer, { kind: 'invoice', id })).rejects.toMatchObject({
    kind: expect.stringMatching(/missing|forbidden/),
  });
  await expect(renderPaper({ kind: 'visitor' }, { kind: 'invoice', id })).rejects.toMatchObject({ kind: 'missing' });
});
