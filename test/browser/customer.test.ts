import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { type Buyer, goToPay, payWith, seePaid } from './buyer';
import { letterTo } from './letterbox';
import { Visitor, launch } from './visitor';

const guest: Buyer = { name: 'Ivo Lind', email: 'ivo@lind.example' };

describe.sequential('a guest and what becomes of the order', () => {
  let browser: Browser;
  let buyer: Visitor;
  let stranger: Visitor;
  let orderUrl = '';

  beforeAll(async () => {
    browser = await launch();
    buyer = await Visitor.open(browser, 'guest');
    stranger = await Visitor.open(browser, 'stranger');
  });
  afterAll(() => browser.close());

  test('pays with a card that asks for authentication, which can fail first', async () => {
    const { page } = buyer;
    await goToPay(page, 'MW4', guest);
    await payWith(page, '4000002500003155', guest.name);
    await page.getByRole('button', { name: 'Fail authentication' }).click();
    await page.getByLabel('Card number').waitFor();
    await payWith(page, '4000002500003155', guest.name);
    await page.getByRole('button', { name: 'Complete authentication' }).click();
    orderUrl = await seePaid(page);
  });

  test('a paid order cannot be paid again', async () => {
    await buyer.go(orderUrl);
    expect(await buyer.page.getByRole('button', { name: /^Pay / }).count()).toBe(0);
  });

  test('a stranger without the long link, or with another key, sees nothing of it', async () => {
    const path = orderUrl.split('?')[0] ?? '';
    const bare = await stranger.page.goto(path);
    expect(new URL(stranger.page.url()).pathname).toMatch(/sign-in|orders/);
    expect(await stranger.page.locator('body').innerText()).not.toContain(guest.name);
    const wrongKey = await stranger.page.goto(`${path}?key=${'x'.repeat(43)}`);
    expect(await stranger.page.locator('body').innerText()).not.toContain(guest.name);
    for (const answer of [bare, wrongKey]) expect(answer?.status()).not.toBe(500);

    await stranger.signInAs('Edda Holm');
    await stranger.page.goto(path);
    expect(await stranger.page.locator('body').innerText()).not.toContain(guest.name);
    const api = await stranger.page.request.get(`/api/v1${path}`);
    expect([403, 404]).toContain(api.status());
    expect(api.headers()['content-type']).toContain('application/problem+json');
  });

  test('opens an account by a link in the mail and keeps the order in it', async () => {
    const { page } = buyer;
    await buyer.go('/join');
    await page.getByLabel('Name').fill(guest.name);
    await page.getByLabel('E-mail').fill(guest.email);
    await page.getByRole('button', { name: 'Open an account' }).click();
    const letter = await letterTo(guest.email, /sign in|account|welcome/i);
    const link = /https?:\/\/\S+token=[\w-]+/.exec(letter.text)?.[0] ?? '';
    expect(link).not.toBe('');

    // In another browser the link opens nothing.
    await stranger.page.context().clearCookies();
    await stranger.page.goto(link);
    await stranger.page.getByRole('button', { name: 'Sign in', exact: true }).click();
    await stranger.page
      .getByText(/asked for it|new link|browser/i)
      .first()
      .waitFor();

    await page.goto(link);
    await page.getByRole('button', { name: 'Sign in', exact: true }).click();
    await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
    await buyer.go(orderUrl);
    await page.getByRole('button', { name: 'Keep it in my account' }).click();
    await page.getByRole('button', { name: 'Keep it in my account' }).waitFor({ state: 'detached' });
    await buyer.go('/orders');
    await page
      .getByText(/Y-\d{4}/)
      .first()
      .waitFor();
    await buyer.picture('my-orders');
    expect(await buyer.faults()).toEqual([]);
  });

  test('cancels it before a packer begins and gets the money back', async () => {
    const { page } = buyer;
    await buyer.go(orderUrl);
    await page.getByRole('button', { name: 'Cancel the order' }).click();
    await page
      .getByRole('dialog')
      .getByRole('button', { name: /^Cancel Y-/ })
      .click();
    await page
      .getByText(/cancelled/i)
      .first()
      .waitFor();
    await expect
      .poll(
        async () => {
          await page.reload();
          return page.locator('main').innerText();
        },
        { timeout: 20_000, interval: 1000 },
      )
      .toMatch(/paid back|went back|goes back/i);
    await buyer.picture('order-cancelled');
    expect(await buyer.faults()).toEqual([]);
  });

  test('sees no fault in the browser on the way', () => {
    // A refused page is a refused resource to the browser too, so the stranger's complaints are what was asked for.
    expect(buyer.complaints).toEqual([]);
  });
});
