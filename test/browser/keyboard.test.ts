import type { Browser, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, describe, expect, inject, test } from 'vitest';
import { saved } from './designer';
import { Keys } from './keys';
import { pathOf } from './pages';
import { Visitor, launch } from './visitor';

/** The main tasks with keys alone, the focus seen at every stop; and each control's pattern, on a page that uses it. */
let browser: Browser;
let keys: Keys | null = null;

async function sit(person: string | null, path: string): Promise<{ page: Page; keys: Keys }> {
  const visitor = await Visitor.open(browser, 'keys');
  if (person !== null) await visitor.signInAs(person);
  await visitor.go(await pathOf(path));
  const { page } = visitor;
  await page.evaluate(() => new Promise((idle) => requestIdleCallback(idle)));
  keys = new Keys(page);
  return { page, keys };
}

beforeAll(async () => {
  browser = await launch();
});
afterEach(async () => {
  const faults = keys?.faults ?? [];
  await keys?.page.context().close();
  keys = null;
  expect(faults, 'stops at which the focus cannot be seen').toEqual([]);
});
afterAll(async () => {
  await browser.close();
});

describe('with keys alone', () => {
  test('a guest skips the bar, chooses a kit, and buys it up to the page of payment', async () => {
    const { page, keys: k } = await sit(null, '/');
    await page.keyboard.press('Tab');
    expect(await k.standsOn(page.getByRole('link', { name: 'To the content' }))).toBe(true);
    await page.keyboard.press('Enter');
    await k.press(page.getByRole('link', { name: 'Tollgate', exact: true }));
    await page.getByRole('heading', { name: 'Tollgate', level: 1 }).waitFor();
    await k.press(page.getByRole('button', { name: 'Put in basket' }));
    await k.press(page.getByRole('link', { name: 'Go to the basket' }));
    await page.getByRole('heading', { name: 'Basket', level: 1 }).waitFor();
    await k.press(page.getByRole('link', { name: /address|checkout/i }).last());
    await page.getByRole('heading', { name: 'Checkout', level: 1 }).waitFor();

    // Sent empty: the summary takes the focus, and its links lead to the fields.
    await k.press(page.getByRole('button', { name: /^Pay £/ }));
    await page.getByRole('alert').first().waitFor();
    await k.press(page.getByRole('alert').getByRole('link').first());
    expect(await k.standsOn(page.getByLabel('E-mail'))).toBe(true);
    await k.write(page.getByLabel('E-mail'), 'kit@harbin.example');
    await k.write(page.getByLabel('Name on the label'), 'Kit Harbin');
    await k.write(page.getByLabel('Street and number, or house'), '4 Sluice Row');
    await k.write(page.getByLabel('Town'), 'Pellstow');
    await k.write(page.getByLabel('Postcode'), 'PW2 4SR');
    await k.press(page.getByRole('button', { name: /^Pay £/ }));
    await page.waitForURL((url) => url.href.startsWith(inject('payUrl')));
  });

  test('a designer changes the turns of a version and sends it to check', async () => {
    const { page, keys: k } = await sit('Isolde Hark', '/bench/:mine');
    const turns = page.getByRole('textbox', { name: 'Turns', exact: true });
    await k.write(turns, '82');
    await page.keyboard.press('Tab');
    await saved(page);
    await k.press(page.getByRole('button', { name: 'Send to check' }));
    await page.getByText('In check').first().waitFor();
  });

  test('a checker holds it with a remark', async () => {
    const { page, keys: k } = await sit('Walter Tarrow', '/check');
    await k.press(page.getByRole('link', { name: /Ebb Lamp.*7.C/s }));
    await page.getByRole('heading', { name: 'Ebb Lamp', level: 1 }).waitFor();
    await k.write(page.getByLabel('Remark'), 'The share of boxes is too low. Two more turns, please.');
    await k.press(page.getByRole('button', { name: 'Hold and send back' }));
    const dialog = page.getByRole('dialog');
    await dialog.waitFor();
    await k.press(dialog.getByRole('button', { name: /hold/i }));
    await page.getByText('Held', { exact: true }).first().waitFor();
  });

  test('a packer types the code of the lot that is asked for, and it is right', async () => {
    const { page, keys: k } = await sit('Bryn Orne', '/packing');
    await k.press(page.getByRole('button', { name: /^Pack this box/ }).first());
    await page.waitForURL(/\/packing\/[0-9a-z]{26}/);
    await page.getByText('Fetch from bin').waitFor();
    const words = await page.getByRole('region', { name: 'What to do' }).innerText();
    const lot = /\bL\d{4}-[A-Z0-9-]+/.exec(words)?.[0] ?? '';
    await k.to(page.getByLabel('Type a code'));
    await page.keyboard.type(lot);
    await page.keyboard.press('Enter');
    await page
      .getByText(/^Right: /)
      .first()
      .waitFor();
  });
});

describe('once round with Tab', () => {
  test.each([
    ['a visitor', '/'],
    ['a visitor', '/kits/MW7'],
    ['a visitor', '/sign-in'],
    ['Isolde Hark', '/bench'],
    ['Isolde Hark', '/bench/:draft'],
    ['Isolde Hark', '/bench/parts/new'],
    ['Walter Tarrow', '/check'],
    ['Bryn Orne', '/packing'],
    ['Bryn Orne', '/packing/dispatch'],
    ['Bryn Orne', '/store/receive'],
    ['Maud Orrin', '/desk'],
    ['Maud Orrin', '/desk/kits'],
  ])('%s reaches all of %s, and is held nowhere', async (person, path) => {
    const { keys: k } = await sit(person === 'a visitor' ? null : person, path);
    expect(await k.unreached()).toEqual([]);
  });
});

describe('each control by its pattern', () => {
  test('a combobox opens on Down, takes on Enter and closes on Escape', async () => {
    const { page, keys: k } = await sit('Bryn Orne', '/store/receive');
    const box = page.getByRole('combobox', { name: /^Part/ });
    await k.to(box);
    await page.keyboard.type('C-36');
    await page.getByRole('option', { name: /^C-365/ }).waitFor();
    expect(await box.getAttribute('aria-expanded')).toBe('true');
    await page.keyboard.press('Escape');
    expect(await box.getAttribute('aria-expanded')).toBe('false');
    await page.keyboard.press('ArrowDown');
    await page.getByRole('option').first().waitFor();
    await page.keyboard.press('Control+a');
    await page.keyboard.type('C-365');
    await page.getByRole('option', { name: /^C-365/ }).waitFor();
    await page.keyboard.press('ArrowDown');
    await page.keyboard.press('Enter');
    expect(await box.inputValue()).toMatch(/^C-365/);
    expect(await box.getAttribute('aria-expanded')).toBe('false');
  });

  test('a dialog takes the focus, keeps it, and gives it back on Escape', async () => {
    const { page, keys: k } = await sit('Walter Tarrow', '/check');
    await k.write(page.getByLabel('Remark'), 'Not yet: the earphone is missing its sheet.');
    const opener = page.getByRole('button', { name: 'Hold and send back' });
    await k.press(opener);
    const dialog = page.getByRole('dialog');
    await dialog.waitFor();
    for (let stops = 0; stops < 6; stops++) {
      const isInside = await dialog.evaluate(
        (element) => element.contains(document.activeElement) || document.activeElement === document.body,
      );
      expect(isInside).toBe(true);
      await page.keyboard.press('Tab');
    }
    await page.keyboard.press('Escape');
    await dialog.waitFor({ state: 'hidden' });
    expect(await k.standsOn(opener)).toBe(true);
  });

  test('versions are tabs in the address: a link each, the present one told', async () => {
    const { page, keys: k } = await sit('Isolde Hark', '/bench/:held');
    const tabs = page.getByRole('navigation', { name: /^Versions of/ });
    expect(await tabs.locator('[aria-current=page]').count()).toBe(1);
    await k.to(tabs.getByRole('link').first());
  });

  test('a disclosure opens and closes on Enter and Space', async () => {
    const { page, keys: k } = await sit(null, '/kits/MW7');
    const summary = page.locator('summary', { hasText: 'Show as table' });
    await k.press(summary, 'Enter');
    await page.getByRole('table', { name: /Reach of Ebb Lamp/ }).waitFor();
    await page.keyboard.press('Space');
    await page.getByRole('table', { name: /Reach of Ebb Lamp/ }).waitFor({ state: 'hidden' });
  });

  test('a stepper steps by its buttons, by the arrows and by typing, and stops at its ends', async () => {
    const { page, keys: k } = await sit(null, '/kits/MW7');
    const number = page.getByRole('spinbutton', { name: 'Number of Ebb Lamp' });
    await k.press(page.getByRole('button', { name: 'One less: Number of Ebb Lamp' }));
    expect(await number.inputValue()).toBe('1');
    await k.to(number);
    await page.keyboard.press('ArrowUp');
    expect(await number.inputValue()).toBe('2');
    await k.press(page.getByRole('button', { name: 'One more: Number of Ebb Lamp' }), 'Space');
    expect(await number.inputValue()).toBe('3');
    await page.keyboard.press('Shift+Tab');
    await page.keyboard.press('Control+a');
    await page.keyboard.type('12');
    expect(await number.inputValue()).toBe('12');
    await page.getByText('£52.20').first().waitFor();
  });

  test('a radio group is one stop; the arrows choose', async () => {
    const { page, keys: k } = await sit(null, '/kits/MW7');
    await k.press(page.getByRole('button', { name: 'Put in basket' }));
    await page.getByText('In your basket').waitFor();
    await page.goto('/checkout');
    const [post, parcel] = [page.getByRole('radio').nth(0), page.getByRole('radio').nth(1)];
    await k.to(post);
    await page.keyboard.press('ArrowDown');
    expect(await k.standsOn(parcel)).toBe(true);
    expect(await parcel.isChecked()).toBe(true);
    await page.keyboard.press('Tab');
    expect(await k.standsOn(page.getByLabel(/^Gift note/))).toBe(true);
  });

  test('a toast says what happened, and its Undo takes it back', async () => {
    const { page, keys: k } = await sit('Piers Lindow', '/bench/:draft');
    await k.press(page.getByRole('button', { name: /^Change line X3/ }));
    await k.press(page.getByRole('button', { name: 'Remove X3' }));
    const toast = page.getByRole('status').filter({ hasText: 'X3 is out of the version.' });
    await toast.waitFor();
    await k.press(toast.getByRole('button', { name: 'Undo' }));
    await page.getByRole('button', { name: /^Change line X3/ }).waitFor();
    await toast.waitFor({ state: 'hidden' });
  });
});
