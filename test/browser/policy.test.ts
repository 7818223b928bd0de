import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { everybody, pages, pathOf, people } from './pages';
import { Visitor, launch } from './visitor';

/** The content security policy as a browser keeps it: nothing of ours breaks it, and no nonce serves twice. */
let browser: Browser;
beforeAll(async () => {
  browser = await launch();
});
afterAll(async () => {
  await browser.close();
});

/** In every page from its first moment: each thing the policy stops, a line each. */
function keepReports(): void {
  const kept: string[] = [];
  Object.assign(window, { policyReports: kept });
  document.addEventListener('securitypolicyviolation', ({ effectiveDirective, blockedURI, sourceFile, sample }) =>
    kept.push(`${effectiveDirective} ${blockedURI} ${sourceFile} ${sample}`),
  );
}

async function reportsOf({ page }: Visitor): Promise<string[]> {
  const found = await page.evaluate(() => {
    const { policyReports } = window as unknown as { policyReports: string[] }; // what the script above put there
    return policyReports;
  });
  return found.map((report) => `${new URL(page.url()).pathname}: ${report}`);
}

async function open(who: (typeof everybody)[number]): Promise<Visitor> {
  const visitor = await Visitor.open(browser, 'policy', { ownPolicy: true });
  await visitor.context.addInitScript(keepReports);
  const person = people[who];
  if (person !== null) await visitor.signInAs(person);
  return visitor;
}

describe.each(everybody)('as %s', (who) => {
  test('no page breaks its own policy', async () => {
    const visitor = await open(who);
    const reports: string[] = [];
    for (const { path } of pages.filter((page) => page.who[0] === who)) {
      await visitor.go(await pathOf(path));
      await visitor.settled();
      reports.push(...(await reportsOf(visitor)));
    }
    expect(reports).toEqual([]);
    await visitor.close();
  });
});

describe('what opens on a page', () => {
  test('a line is searched for and a message shown on the workbench within the policy', async () => {
    const visitor = await open('designer');
    const { page } = visitor;
    await visitor.go(await pathOf('/bench/:draft'));
    await page
      .getByRole('region', { name: 'Hardware', exact: true })
      .getByRole('button', { name: 'Add a line' })
      .click();
    await page.getByRole('button', { name: 'hardware', exact: true }).click();
    await page.getByPlaceholder('Code or name').fill('X-WAX');
    await page.getByRole('option', { name: /^X-WAX/ }).click();
    await page.getByRole('button', { name: /^Change line .*Beeswax block/ }).click();
    await page.getByRole('button', { name: /^Remove [A-Z]\d+$/ }).click();
    await page.getByText(/is out of the version/).waitFor();
    await page.getByRole('slider', { name: 'Turns, slider' }).press('ArrowRight');
    await page.getByRole('slider', { name: 'Turns, slider' }).press('ArrowLeft');
    expect(await reportsOf(visitor)).toEqual([]);
    await visitor.close();
  });

  test('a kit goes into the basket and the checkout refuses an empty form within the policy', async () => {
    const visitor = await open('visitor');
    const { page } = visitor;
    await visitor.go('/kits/MW7');
    await page.getByRole('button', { name: 'Put in basket' }).click();
    await page.getByText('In your basket').waitFor();
    expect(await reportsOf(visitor)).toEqual([]);
    await visitor.go('/checkout');
    await page.getByRole('button', { name: /^Pay £/ }).click();
    await page.getByRole('alert').first().waitFor();
    expect(await reportsOf(visitor)).toEqual([]);
    await visitor.close();
  });
});

const nonceIn = (policy: string | null) => /'nonce-([^']+)'/.exec(policy ?? '')?.[1] ?? '';
const address = (path: string) => `${inject('url')}${path}`;

test('two loads never share a nonce, whatever the page', async () => {
  const nonces: string[] = [];
  for (const path of ['/', '/', '/kits/MW7', '/kits/MW7', '/sign-in', '/nowhere', '/nowhere', '/api/v1/health']) {
    const answer = await fetch(address(path));
    nonces.push(nonceIn(answer.headers.get('content-security-policy')));
    const body = await answer.text();
    if (path.startsWith('/api')) continue;
    expect(body).toContain(`nonce="${nonces.at(-1)}"`);
    expect(body.match(/<script(?![^>]* nonce=)/g)).toBeNull();
    expect(body).not.toMatch(/<[^>]+ style="/);
  }
  expect(new Set(nonces).size).toBe(nonces.length);
  // 16 random bytes in base 64.
  for (const nonce of nonces) expect(nonce).toMatch(/^[A-Za-z0-9+/]{22}==$/);
});

describe.each([
  ['a page', '/', 200],
  ['a page that is not there', '/nowhere', 404],
  ['a page that asks to sign in', '/desk', 307],
  ['an answer to a program', '/api/v1/health', 200],
  ['a refusal to a program', '/api/v1/orders/zzzzzzzzzzzzzzzzzzzzzzzzzz', 404],
  ['a paper that is not shown', '/papers/slip/zzzzzzzzzzzzzzzzzzzzzzzzzz', 404],
])('the headers of %s', (_, path, status) => {
  test('guard it', async () => {
    const { headers, status: answered } = await fetch(address(path), { redirect: 'manual' });
    expect(answered).toBe(status);
    const policy = headers.get('content-security-policy') ?? '';
    for (const rule of ["default-src 'none'", "'strict-dynamic'", "object-src 'none'", "base-uri 'none'"]) {
      expect(policy).toContain(rule);
    }
    expect(policy).toContain("frame-ancestors 'none'");
    expect(policy).not.toContain('unsafe');
    expect(headers.get('x-content-type-options')).toBe('nosniff');
    expect(headers.get('x-frame-options')).toBe('DENY');
    expect(headers.get('referrer-policy')).toBe('strict-origin-when-cross-origin');
    expect(headers.get('cross-origin-opener-policy')).toBe('same-origin');
    expect(headers.get('permissions-policy')).toMatch(/camera=\(\)/);
    expect(headers.get('x-powered-by')).toBeNull();
  });
});
