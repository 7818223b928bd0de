import type { Knex } from 'knex';
import { z } from 'zod';
import { type Actor, must } from '../access';
import { readSignOff } from '../check';
import type { KitId, VersionId } from '../ids';
import { readFrozen, storedVerdict } from '../kits';
import { cautionNote, cautions } from '../kits/cautions';
import { allFindings, contentMass, findingKey } from '../kits/rules';
import { log } from '../log';
import { type Money, money } from '../money';
import { Problem, missing, parse, refused } from '../problem';
import { reading } from '../record';
import { buildable } from '../stock';
import { chanceOf } from './chance';
import * as rows from './rows';
import { bandName, lineCost, matches, reachOf, shapeOf, shopCurrency, unitPrice } from './rules';
import { type KitCard, KitPage, OnSale, type PriceStep, PricedKit } from './schemas';

const Search = z.strictObject({ q: z.string().trim().max(80).optional() });

/** The kits on sale: of each the version released last, newest release first. */
export async function listOnSale(actor: Actor, input: z.input<typeof Search> = {}): Promise<OnSale> {
  must(actor, 'catalogue.read');
  const { q = '' } = parse(Search, input);
  const sql = reading();
  const releases = await rows.currentReleases(sql);
  const prices = await rows.pricesOf(
    sql,
    releases.map((release) => release.kitId),
  );
  const cards: KitCard[] = [];
  for (const release of releases) cards.push(...(await soundCard(sql, release, prices.get(release.kitId) ?? [])));
  return OnSale.parse({ kits: q === '' ? cards : cards.filter((card) => matches(card, q)) });
}

/** A version that fails its hash is not sold; the other kits still are. */
async function soundCard(sql: Knex, release: rows.Release, prices: PriceStep[]): Promise<KitCard[]> {
  try {
    return [await cardOf(sql, release, prices)];
  } catch (error) {
    if (!(error instanceof Problem)) throw error;
    log().error({ version: release.versionId, error: error.message }, 'a released version is not shown');
    return [];
  }
}

async function cardOf(sql: Knex, release: rows.Release, prices: PriceStep[]): Promise<KitCard> {
  const { content, verdict, letter, kitId, id } = await readFrozen(sql, release.versionId);
  const { kit } = content;
  return {
    kitId,
    versionId: id,
    code: kit.code,
    number: kit.number,
    name: kit.name,
    letter,
    summary: kit.summary,
    ageFrom: kit.ageFrom,
    bandName: bandName(kit.band),
    reach: reachOf(storedVerdict(verdict), content),
    stations: content.circuit.place.stations.map(({ name, f }) => ({ name, f })),
    shape: shapeOf(content),
    prices,
    ready: (await buildable(sql, content)).count,
    releasedAt: release.releasedAt,
  };
}

/** The page of the kit with this code: its newest released version, how it was checked, what is in the box. */
export async function readKitPage(actor: Actor, code: string): Promise<KitPage> {
  must(actor, 'catalogue.read');
  const sql = reading();
  const release = (await rows.currentReleases(sql)).find((one) => one.code === code.toUpperCase());
  if (!release) throw missing('No kit with this code is on sale. The catalogue lists those that are.');
  const prices = (await rows.pricesOf(sql, [release.kitId])).get(release.kitId) ?? [];
  const { content } = await readFrozen(sql, release.versionId);
  return KitPage.parse({
    ...(await cardOf(sql, release, prices)),
    audience: content.kit.audience,
    box: content.lines.flatMap(({ reference, place, quantity, part }) =>
      part ? [{ reference, place, quantity, name: part.name, unit: part.unit, values: part.values }] : [],
    ),
    circuit: content.circuit,
    guide: content.guide,
    cautions: content.guide.cautions.map((caution) => ({ code: caution, ...cautions[caution] })),
    cautionNote,
    massMilligrams: contentMass(content),
    contour: chanceOf(release.versionId, content),
    check: await checkOf(sql, release.versionId),
  });
}

async function checkOf(sql: Knex, versionId: VersionId): Promise<z.input<typeof KitPage>['check']> {
  const signOff = await readSignOff(sql, versionId);
  if (!signOff) return null;
  const { by, at, contentHash, engineVersion, rulesVersion, verdict, reasons } = signOff;
  const { content } = await readFrozen(sql, versionId);
  return {
    by,
    at,
    contentHash,
    engineVersion,
    rulesVersion,
    share: verdict.share && { covered: verdict.share.covered, boxes: verdict.share.boxes },
    findings: allFindings(verdict, content).map((finding) => ({
      severity: finding.severity,
      message: finding.message,
      reason: reasons[findingKey(finding)] ?? null,
    })),
  };
}

/** What one kit costs when so many are bought, tax included. */
export async function priceFor(sql: Knex, kitId: KitId, quantity: number): Promise<Money> {
  const steps = (await rows.pricesOf(sql, [kitId])).get(kitId) ?? [];
  const unit = unitPrice(steps, quantity);
  if (!unit) throw refused('This kit has no price yet. Come back when it has one.');
  return unit;
}

/** Every kit with a released version, with its prices, its cost and what limits building it: for the owner. */
export async function listPriced(actor: Actor): Promise<PricedKit[]> {
  must(actor, 'price.set');
  const sql = reading();
  const releases = await rows.currentReleases(sql);
  const prices = await rows.pricesOf(
    sql,
    releases.map((release) => release.kitId),
  );
  const priced: PricedKit[] = [];
  for (const { kitId, versionId } of releases) {
    const { content, letter, state, verdict } = await readFrozen(sql, versionId);
    const { count, limitedBy } = await buildable(sql, content);
    const costs = await rows.costsByCode(
      sql,
      content.lines.flatMap((line) => (line.part ? [line.part.code] : [])),
    );
    const cost = content.lines.reduce((all, line) => all + lineCost(line, costs.get(line.part?.code ?? '') ?? 0), 0);
    priced.push(
      PricedKit.parse({
        kitId,
        code: content.kit.code,
        number: content.kit.number,
        name: content.kit.name,
        letter,
        state,
        reach: reachOf(storedVerdict(verdict), content),
        prices: prices.get(kitId) ?? [],
        ready: count,
        limitedBy,
        cost: money(Math.round(cost), shopCurrency),
      }),
    );
  }
  return priced.sort((a, b) => a.number - b.number);
}
