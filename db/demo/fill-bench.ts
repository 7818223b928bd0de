import * as check from '@/services/check';
import type { PartId, VersionId } from '@/services/ids';
import * as kits from '@/services/kits';
import { findingKey, notesIn } from '@/services/kits/rules';
import * as parts from '@/services/parts';
import { wireLength } from '@/services/receiver';
import * as catalogue from '@/services/catalogue';
import { guideOf } from './guide';
import { type DemoKit, type DemoSet, type DemoVersion, circuitOf, demoKits, linesOf } from './kits';
import { demoParts } from './parts';
import { as, goTo, pass } from './yard';

export type PartIds = ReadonlyMap<string, PartId>;

export async function fillParts(): Promise<PartIds> {
  const ids = new Map<string, PartId>();
  for (const part of demoParts) {
    const { id } = await parts.addPart(as('Isolde Hark'), part);
    ids.set(part.code, id);
  }
  return ids;
}

/** Millimetres of wire to cut for a coil: what the winding takes, 3 % more, up to the next tenth of a metre. */
function cutFor(set: DemoSet): number {
  const part = (code: string) => demoParts.find((one) => one.code === code)?.values;
  const former = part(set.former);
  const wire = part(set.wire);
  if (former?.kind !== 'coil-former' || wire?.kind !== 'wire')
    throw new Error(`${set.former} and ${set.wire} make no coil.`);
  const taps = [set.aerialTap, set.detectorTap].filter((tap) => tap !== undefined).length;
  const length = wireLength({
    turns: set.turns,
    diameter: former.outerDiameter.nominal + wire.overall,
    pitch: set.pitch ?? 1.03 * wire.overall,
    taps,
  });
  return Math.ceil(length * 10.3) * 100;
}

async function drawVersion(kitName: string, versionId: VersionId, version: DemoVersion, ids: PartIds): Promise<void> {
  const designer = as(version.by);
  const { set } = version;
  for (const [reference, place, code, quantity] of linesOf(set, cutFor(set))) {
    const partId = ids.get(code);
    if (!partId) throw new Error(`The demo has no part ${code}.`);
    const { lines } = await kits.readVersion(designer, versionId);
    const line = lines.find((one) => one.reference === reference);
    if (!line) await kits.addLine(designer, { versionId, place, partId, reference, quantity, note: '' });
    else if (line.partId !== partId || line.quantity !== quantity) {
      await kits.saveLine(designer, {
        lineId: line.id,
        basedOn: line.saveNo,
        place,
        partId,
        reference,
        quantity,
        note: '',
      });
    }
  }
  const wanted = new Set(linesOf(set, 1).map(([reference]) => reference));
  const drawn = await kits.readVersion(designer, versionId);
  for (const line of drawn.lines) {
    if (!wanted.has(line.reference)) await kits.removeLine(designer, { lineId: line.id });
  }
  const before = await kits.readVersion(designer, versionId);
  await kits.saveCircuit(designer, { versionId, circuit: circuitOf(set), basedOn: before.saveNo });
  const { saveNo } = await kits.readVersion(designer, versionId);
  await kits.saveGuide(designer, { versionId, guide: guideOf(kitName, set), basedOn: saveNo });
}

/** What a checker writes beside a note, by what the note is about. */
function reasonFor({ code, path }: { code: string; path: string }): string {
  if (code === 'DATA-NONE') {
    if (path.startsWith('coil'))
      return 'Wound to the table and counted; the guide has a resistance to compare at the end.';
    if (path.startsWith('tuning')) return 'The maker’s sheet gives both ends; the worst of them still covers the band.';
    return 'Estimated wide on purpose, and the band holds at its worst.';
  }
  if (code.startsWith('PHONE'))
    return 'Enough near the coast stations; the kit’s page says what to expect farther away.';
  return 'Known and said in the guide.';
}

async function judge(versionId: VersionId, { fate, remark = '', by }: DemoVersion): Promise<void> {
  if (fate === 'draft') return;
  const { saveNo } = await kits.readVersion(as(by), versionId);
  await check.sendToCheck(as(by), { versionId, basedOn: saveNo });
  if (fate === 'in-check') return;
  pass(150);
  const checker = as('Walter Tarrow');
  const sheet = await check.readSheet(checker, versionId);
  const { contentHash, findings } = sheet;
  if (fate === 'held') {
    await check.hold(checker, { versionId, contentHash, remark });
    return;
  }
  const reasons = Object.fromEntries(notesIn(findings).map((finding) => [findingKey(finding), reasonFor(finding)]));
  await check.release(checker, { versionId, contentHash, reasons, remark: 'Recomputed; it holds.' });
  if (fate === 'withdrawn') {
    pass(24 * 60 * 6);
    await check.withdraw(as('Maud Orrin'), { versionId, reason: remark });
  }
}

async function drawKit({ kit, pence, versions }: DemoKit, ids: PartIds, day: number): Promise<void> {
  const [first] = versions;
  if (!first) throw new Error(`${kit.name} has no version.`);
  const { kitId, versionId } = await kits.createKit(as(first.by), kit);
  let current = versionId;
  for (const [index, version] of versions.entries()) {
    goTo(day + index * 2, 10, 15);
    if (index > 0) current = (await kits.startVersion(as(version.by), { kitId, fromVersionId: current })).versionId;
    await drawVersion(kit.name, current, version, ids);
    await judge(current, version);
  }
  const unit = (minor: number) => ({ minor, currency: 'GBP' as const });
  await catalogue.setPrice(as('Maud Orrin'), {
    kitId,
    steps: [
      { fromQuantity: 1, unit: unit(pence) },
      { fromQuantity: 10, unit: unit(Math.round(pence * 0.9)) },
      { fromQuantity: 30, unit: unit(Math.round(pence * 0.82)) },
    ],
  });
}

/** Kits, their versions and what the check room said of them. */
export async function fillBench(ids: PartIds): Promise<void> {
  for (const [index, kit] of demoKits.entries()) {
    const day = 1 + index;
    goTo(day, 9, 5 * index);
    await drawKit(kit, ids, day);
  }
}
