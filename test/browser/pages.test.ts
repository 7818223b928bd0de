import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { everybody, guarded, pages, pathOf, people, refusals, type Who } from './pages';
import { Visitor, launch } from './visitor';

/** Every page as everybody who may see it: readable by machine, quiet, inside every screen, and called something. */
const widths = [1440, 390, 320] as const;

let browser: Browser;
const visitors = new Map<Who, Visitor>();

async function visitorOf(who: Who): Promise<Visitor> {
  const known = visitors.get(who);
  if (known) return known;
  const visitor = await Visitor.open(browser, who);
  const person = people[who];
  if (person !== null) await visitor.signInAs(person);
  visitors.set(who, visitor);
  return visitor;
}

beforeAll(async () => {
  browser = await launch();
});
afterAll(async () => {
  await browser.close();
});

/** The widths at which the page is wider than the screen. */
async function tooWide({ page }: Visitor): Promise<number[]> {
  const found: number[] = [];
  for (const width of widths) {
    await page.setViewportSize({ width, height: 900 });
    const over = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
    if (over > 0) found.push(width);
  }
  await page.setViewportSize({ width: 1440, height: 900 });
  return found;
}

const headingsOf = ({ page }: Visitor) => page.locator('h1').count();

describe.each(everybody)('as %s', (who) => {
  const titles = new Map<string, string>();

  test.each(pages.filter((page) => page.who.includes(who)))('$path is whole, quiet and fits', async ({ path }) => {
    const visitor = await visitorOf(who);
    const { page } = visitor;
    const answer = await page.goto(await pathOf(path));
    expect(answer?.status()).toBe(200);
    await page.locator('h1').first().waitFor();
    await visitor.settled();
    expect(await visitor.faults()).toEqual([]);
    expect(await tooWide(visitor)).toEqual([]);
    expect(await headingsOf(visitor)).toBe(1);
    expect(visitor.takeComplaints()).toEqual([]);

    const title = await page.title();
    const { pathname, search } = new URL(page.url());
    expect(title).toMatch(pathname === '/' && search === '' ? /^Coilyard$/ : /^\S.*: Coilyard$/);
    const other = titles.get(title);
    expect(other === undefined || other === pathname + search, `${other} is called "${title}" too`).toBe(true);
    titles.set(title, pathname + search);
  });
});

describe.each(pages.filter((page) => page.dark))('$path in the dark', ({ path, who }) => {
  const [first] = who;
  test('is whole and quiet', async () => {
    if (first === undefined) throw new Error(`Nobody may see ${path}.`);
    const visitor = await visitorOf(first);
    await visitor.page.emulateMedia({ colorScheme: 'dark' });
    try {
      await visitor.go(await pathOf(path));
      await visitor.settled();
      const ground = await visitor.page.evaluate(
        () => getComputedStyle(document.querySelector('[data-theme]') ?? document.body).backgroundColor,
      );
      expect(ground).toBe('rgb(18, 21, 31)');
      expect(await visitor.faults()).toEqual([]);
      expect(visitor.takeComplaints()).toEqual([]);
    } finally {
      await visitor.page.emulateMedia({ colorScheme: 'light' });
    }
  });
});

describe.each(refusals)('as $who, refused with $status', ({ who, status, paths }) => {
  test.each(paths)('%s says so, and where to go on', async (path) => {
    const visitor = await visitorOf(who);
    const { page } = visitor;
    const answer = await page.goto(await pathOf(path));
    expect(answer?.status()).toBe(status);
    expect(await headingsOf(visitor)).toBe(1);
    expect(await page.getByRole('main').getByRole('link').count()).toBeGreaterThan(0);
    expect(await visitor.faults()).toEqual([]);
    expect(await tooWide(visitor)).toEqual([]);
    // The browser notes the status itself; nothing else is wrong.
    expect(visitor.takeComplaints().filter((line) => !line.includes(`status of ${status}`))).toEqual([]);
  });
});

test('the size of targets is among the rules that are run', async () => {
  const visitor = await visitorOf('visitor');
  await visitor.go('/');
  expect(await visitor.rulesRun()).toContain('target-size');
});

test.each(guarded)('a visitor who asks for %s signs in first and comes back there', async (path) => {
  const visitor = await visitorOf('visitor');
  await visitor.go(path);
  const { pathname, searchParams } = new URL(visitor.page.url());
  expect(pathname).toBe('/sign-in');
  expect(searchParams.get('next')).toBe(path);
});
