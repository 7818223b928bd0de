import { type Actor, must, personIdOf } from '../access';
import { VersionId } from '../ids';
import { missing } from '../problem';
import { reading } from '../record';
import { Verdict } from '../receiver';
import { heldBefore } from './held';
import {
  type Kit,
  type Line,
  type Version,
  allKits,
  contentOf,
  editorsOf,
  findVersion,
  getKit,
  linesOf,
  versionsOfKit,
} from './rows';
import { type LineView, VersionContent, type VersionView } from './schemas';
import type { Knex } from 'knex';

/** The whole of one version, as the workbench and the API show it. */
export async function readVersion(actor: Actor, id: string): Promise<VersionView> {
  must(actor, 'version.read');
  const versionId = VersionId.safeParse(id);
  const version = versionId.success ? await findVersion(reading(), versionId.data) : null;
  if (!version) throw missing('There is no such version. Look for it on the bench.');
  return viewOf(reading(), actor, version);
}

export async function viewOf(sql: Knex, actor: Actor, version: Version): Promise<VersionView> {
  const [kit, lines, editors, siblings] = [
    await getKit(sql, version.kitId),
    await linesOf(sql, version.id),
    await editorsOf(sql, version.id),
    await versionsOfKit(sql, version.kitId),
  ];
  const content = contentNow(kit, version, lines);
  const me = personIdOf(actor);
  return {
    id: version.id,
    kitId: version.kitId,
    letter: version.letter,
    state: version.state,
    saveNo: version.saveNo,
    content,
    contentHash: version.contentHash,
    lines: lines.map((line) => lineView(line, content)),
    editors: editors.map(({ id, name }) => ({ id, name })),
    own: editors.some(({ id }) => id === me),
    createdAt: version.createdAt,
    updatedAt: version.updatedAt,
    sentAt: version.sentAt,
    siblings: siblings.map(({ id, letter, state }) => ({ id, letter, state })),
    held: await heldBefore(sql, version, content),
  };
}

/** A draft is what its rows say; anything later is what was frozen, whatever happened to parts since. */
function contentNow(kit: Kit, version: Version, lines: readonly Line[]): VersionContent {
  return version.frozen === null ? contentOf(kit, version, lines) : VersionContent.parse(JSON.parse(version.frozen));
}

function lineView(line: Line, content: VersionContent): LineView {
  const frozen = content.lines.find((one) => one.reference === line.reference);
  return {
    id: line.id,
    reference: line.reference,
    place: line.place,
    quantity: line.quantity,
    note: line.note,
    position: line.position,
    saveNo: line.saveNo,
    partId: line.partId,
    part: frozen ? frozen.part : line.part,
    costMinor: lineCost(line),
    retired: line.retired,
  };
}

/** What the line costs in the box, in minor units of the part's currency. */
const lineCost = ({ cost, part, quantity }: Line) => {
  if (!cost || !part) return 0;
  return part.unit === 'each' ? cost.minor * quantity : Math.round((cost.minor * quantity) / 1000);
};

export interface KitView extends Kit {
  versions: { id: VersionId; letter: string; state: Version['state'] }[];
}

export async function listKits(actor: Actor): Promise<KitView[]> {
  must(actor, 'kit.read-all');
  const kits: KitView[] = [];
  for (const kit of await allKits(reading())) {
    const versions = await versionsOfKit(reading(), kit.id);
    kits.push({ ...kit, versions: versions.map(({ id, letter, state }) => ({ id, letter, state })) });
  }
  return kits;
}

/** A verdict that was stored as text, or null when it is of another engine's form. */
export function storedVerdict(text: string | null): Verdict | null {
  if (text === null) return null;
  const parsed = Verdict.safeParse(JSON.parse(text));
  return parsed.success ? parsed.data : null;
}
