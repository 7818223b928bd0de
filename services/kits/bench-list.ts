import { type Actor, must, personIdOf } from '../access';
import type { KitId, VersionId } from '../ids';
import { Problem } from '../problem';
import { reading } from '../record';
import type { Verdict } from '../receiver';
import { evaluateContent } from './evaluation';
import { type Kit, type Version, allKits, allVersions, contentOf, editorsOf, linesOf } from './rows';
import { allFindings, stopsIn } from './rules';
import { VersionContent, type VersionState } from './schemas';
import { storedVerdict } from './views';

/** What a row of the bench says of a version's verdict. */
export interface VerdictSummary {
  reach: Verdict['reach'];
  /** Sentences of what stops it; empty when it clears. */
  stops: string[];
}

export interface BenchVersion {
  id: VersionId;
  letter: string;
  state: VersionState;
  updatedAt: number;
  sentAt: number | null;
  mine: boolean;
  editors: string[];
  /** Null while something is not chosen yet; then `lacks` says what. */
  summary: VerdictSummary | null;
  lacks: string | null;
}

export interface BenchKit {
  kitId: KitId;
  code: string;
  number: number;
  name: string;
  band: Kit['band'];
  /** Newest first. */
  versions: BenchVersion[];
}

/** Every kit with its versions and what each one's verdict says in short. */
export async function listVersions(actor: Actor): Promise<BenchKit[]> {
  must(actor, 'kit.read-all');
  const sql = reading();
  const versions = await allVersions(sql);
  const kits: BenchKit[] = [];
  for (const kit of await allKits(sql)) {
    const own = versions.filter((version) => version.kitId === kit.id);
    const rows: BenchVersion[] = [];
    for (const version of own.reverse()) rows.push(await rowOf(actor, kit, version));
    kits.push({ kitId: kit.id, code: kit.code, number: kit.number, name: kit.name, band: kit.band, versions: rows });
  }
  return kits;
}

async function rowOf(actor: Actor, kit: Kit, version: Version): Promise<BenchVersion> {
  const editors = await editorsOf(reading(), version.id);
  return {
    id: version.id,
    letter: version.letter,
    state: version.state,
    updatedAt: version.updatedAt,
    sentAt: version.sentAt,
    mine: editors.some(({ id }) => id === personIdOf(actor)),
    editors: editors.map(({ name }) => name),
    ...(version.frozen === null ? await draftSummary(kit, version) : frozenSummary(version, version.frozen)),
  };
}

/** Drafts are judged without boxes here: some milliseconds each, enough for reach and rules. */
async function draftSummary(kit: Kit, version: Version): Promise<Pick<BenchVersion, 'summary' | 'lacks'>> {
  const content = contentOf(kit, version, await linesOf(reading(), version.id));
  try {
    const { verdict, findings } = evaluateContent(content, { boxes: 0, seed: 1 });
    return { summary: summaryOf(verdict, findings), lacks: null };
  } catch (error) {
    if (error instanceof Problem) return { summary: null, lacks: error.message };
    throw error;
  }
}

function frozenSummary(version: Version, frozen: string): Pick<BenchVersion, 'summary' | 'lacks'> {
  const verdict = storedVerdict(version.verdict);
  if (!verdict)
    return { summary: null, lacks: 'Its verdict is of an older engine. Open the check sheet to work it out again.' };
  return { summary: summaryOf(verdict, allFindings(verdict, VersionContent.parse(JSON.parse(frozen)))), lacks: null };
}

export const summaryOf = (verdict: Verdict, findings: ReturnType<typeof allFindings>): VerdictSummary => ({
  reach: verdict.reach,
  stops: stopsIn(findings).map(({ message }) => message),
});
