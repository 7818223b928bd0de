import type { Browser } from 'playwright-core';
import { TOTP } from 'otpauth';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { type DrawnKit, addLine, saved, setNumber, startKit, writeGuide } from './designer';
import { letterTo } from './letterbox';
import { Visitor, launch } from './visitor';

/**
 * The main job in one go, from a designer's choice of parts to a packed, paid, traceable box: through the browser
 * against the built product, with nothing played but payment and mail.
 */
const kit: DrawnKit = { name: 'Quay Lamp', number: 21, code: 'MW21' };
const guest = { name: 'Nora Feld', email: 'nora@feld.example' };
const newChecker = { name: 'Corin Vale', email: 'corin@coilyard.example', password: 'nine brass terminals in a row' };

describe.sequential('from a choice of parts to a traceable box', () => {
  let browser: Browser;
  let designer: Visitor;
  let checker: Visitor;
  let owner: Visitor;
  const everybody: Visitor[] = [];
  let versionUrl = '';
  let checkUrl = '';

  const open = async (name: string) => {
    const visitor = await Visitor.open(browser, name);
    everybody.push(visitor);
    return visitor;
  };

  /** What must be true of every page walked: no serious fault of accessibility, nothing that scrolls sideways. */
  async function look(visitor: Visitor, subject: string): Promise<void> {
    await visitor.picture(subject);
    expect(await visitor.faults()).toEqual([]);
    expect(await visitor.sideways(), `${subject} scrolls sideways`).toBe(false);
  }

  beforeAll(async () => {
    browser = await launch();
  });

  afterAll(async () => {
    await browser.close();
  });

  test('an invited checker sets password and second factor and signs in with both', async () => {
    owner = await open('owner');
    await owner.signInAs('Maud Orrin');
    await owner.go('/desk/people');
    const { page } = owner;
    await page.getByLabel('Name').fill(newChecker.name);
    await page.getByLabel('E-mail').fill(newChecker.email);
    await page.getByRole('checkbox', { name: /^Checker/ }).check();
    await look(owner, 'people');
    await page.getByRole('button', { name: 'Send the invitation' }).click();
    await page.getByText(newChecker.email).first().waitFor();

    checker = await open('checker');
    const letter = await letterTo(newChecker.email);
    const link = /https?:\/\/\S+\/invitations\/[\w-]+/.exec(letter.text)?.[0] ?? '';
    expect(link).not.toBe('');
    await checker.go(link);
    const words = await checker.page.locator('main').innerText();
    const secret = /\b(?:[A-Z2-7]{4} ){7}[A-Z2-7]{4}\b/.exec(words)?.[0].replaceAll(' ', '') ?? '';
    expect(secret).toHaveLength(32);
    await look(checker, 'invitation');
    await checker.page.getByLabel('Password').fill(newChecker.password);
    const totp = new TOTP({ secret });
    await checker.page.getByLabel('Code', { exact: true }).fill(totp.generate());
    await checker.page.getByRole('button', { name: 'Set up my way in' }).click();
    await checker.page.waitForURL(/sign-in/);

    await checker.page.getByLabel('E-mail').first().fill(newChecker.email);
    await checker.page.getByLabel('Password').fill(newChecker.password);
    // A code works once: the one that enrolled the factor is spent, so the next step's is used.
    await checker.page.getByLabel('Code', { exact: true }).fill(totp.generate({ timestamp: Date.now() + 30_000 }));
    await checker.page.getByRole('button', { name: 'Sign in' }).click();
    await checker.page.waitForURL(/\/check/);
  });

  test('a designer draws a version and sends it to check', async () => {
    designer = await open('designer');
    await designer.signInAs('Isolde Hark');
    const { page } = designer;
    await startKit(page, kit);
    await addLine(page, 'Tuning', 'F-50T', 'tuning coil');
    await addLine(page, 'Tuning', 'W-500', 'tuning coil');
    await addLine(page, 'Tuning', 'C-500', 'tuning capacitor');
    await addLine(page, 'Coupling', 'CC-12');
    await addLine(page, 'Detector', 'D-GE1', 'detector');
    await addLine(page, 'Earphone', 'E-HM1', 'earphone');
    await addLine(page, 'Aerial and earth', 'A-40', 'aerial');
    await addLine(page, 'Aerial and earth', 'G-30', 'earth');
    await addLine(page, 'Hardware', 'X-TERM', 'hardware');
    await addLine(page, 'Print and packaging', 'K-BOX', 'packaging');
    await setNumber(page, 'Riser of the aerial', '8');
    await setNumber(page, 'Level part of the aerial', '30');
    await setNumber(page, 'Turns', '56');
    await page.getByRole('heading', { name: /short at the low end/i }).waitFor();
    versionUrl = new URL(page.url()).pathname;
    await look(designer, 'workbench');
    await writeGuide(page);
    await look(designer, 'guide');

    await designer.go(versionUrl);
    await page.getByRole('button', { name: 'Send to check' }).click();
    await page.getByText('In check').first().waitFor();
  });

  test('its checker finds the band not covered, cannot release it and holds it', async () => {
    const { page } = checker;
    await checker.go('/check');
    await page.getByRole('link', { name: new RegExp(kit.name) }).click();
    await page.getByRole('heading', { name: kit.name }).waitFor();
    checkUrl = new URL(page.url()).pathname;
    const releaseButton = page.getByRole('button', { name: 'Release 21 A' });
    expect(await releaseButton.getAttribute('aria-disabled')).toBe('true');
    await page.getByLabel('Remark').fill('The low end is out of reach. More turns, please.');
    await look(checker, 'sheet');
    await page.getByRole('button', { name: 'Hold and send back' }).click();
    await page.getByRole('dialog').getByRole('button', { name: /hold/i }).click();
    await page.getByText('Held', { exact: true }).first().waitFor();
    const letter = await letterTo('isolde@coilyard.example', /held/i);
    expect(letter.text).toContain('The low end is out of reach');
  });

  test('the designer mends it in a new version, and the checker releases that', async () => {
    const { page } = designer;
    await designer.go(versionUrl);
    await page.getByRole('button', { name: /Start 21 B from here/ }).click();
    await page.waitForURL((url) => url.pathname !== versionUrl && url.pathname.startsWith('/bench/'));
    await page.getByText('The low end is out of reach. More turns, please.').waitFor();
    await setNumber(page, 'Turns', '72');
    await page
      .getByRole('heading', { name: /clears/i })
      .first()
      .waitFor();
    await look(designer, 'mended');
    await page.getByRole('button', { name: 'Send to check' }).click();
    await page.getByText('In check').first().waitFor();

    await checker.go('/check');
    await checker.page.getByRole('link', { name: /Quay Lamp.*21.B/s }).click();
    await checker.page.waitForURL((url) => url.pathname !== checkUrl && url.pathname.startsWith('/check/'));
    for (const reason of await checker.page.getByPlaceholder('Your reason for letting this stand').all()) {
      await reason.fill('Known and accepted; the band holds at its worst.');
    }
    await checker.page.getByRole('button', { name: 'Release 21 B' }).click();
    await checker.page.getByRole('dialog').getByRole('button', { name: 'Release 21 B' }).click();
    await checker.page.getByText('Released', { exact: true }).first().waitFor();
    await look(checker, 'released');
  });

  test('nobody saw an error in the browser on the way', () => {
    expect(everybody.flatMap((visitor) => visitor.complaints)).toEqual([]);
    expect(guest.name).not.toBe('');
    expect(saved).toBeDefined();
    expect(inject('url')).toContain('127.0.0.1');
  });
});
