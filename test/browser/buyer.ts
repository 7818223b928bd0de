import type { Page } from 'playwright-core';
import { inject } from 'vitest';

export interface Buyer {
  name: string;
  email: string;
}

/** Puts kits in the basket and goes as far as the payment page. */
export async function goToPay(page: Page, kitCode: string, buyer: Buyer): Promise<void> {
  await page.goto(`/kits/${kitCode}`);
  await page.getByRole('button', { name: 'Put in basket' }).click();
  await page.getByText(/^In your basket:/).waitFor();
  await page.goto('/checkout');
  await page.getByLabel('E-mail').fill(buyer.email);
  await page.getByLabel('Name on the label').fill(buyer.name);
  await page.getByLabel('Street and number, or house').fill('3 Tide Lane');
  await page.getByLabel('Town').fill('Pellstow');
  await page.getByLabel('Postcode').fill('PW1 3TL');
  await page.getByRole('button', { name: /^Pay £/ }).click();
  await page.waitForURL((url) => url.href.startsWith(inject('payUrl')));
}

export async function payWith(page: Page, card: string, name: string): Promise<void> {
  await page.getByLabel('Card number').fill(card);
  await page.getByLabel('Good until').fill('12/34');
  await page.getByLabel('Security code').fill('123');
  await page.getByLabel('Name on the card').fill(name);
  await page.getByRole('button', { name: /^Pay / }).click();
}

/** Waits on the order page until our own row says paid; gives the page's address. */
export async function seePaid(page: Page): Promise<string> {
  await page.waitForURL((url) => url.href.startsWith(inject('url')) && url.pathname.startsWith('/orders/'));
  await page
    .getByText(/^Paid(, now)?$/)
    .first()
    .waitFor();
  const { pathname, search } = new URL(page.url());
  return pathname + search;
}
