import { execFileSync } from 'node:child_process';
import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Page } from 'playwright-core';

/** What a packer does at the tray, with a scanner that is a fast keyboard. */
export async function scan(page: Page, code: string): Promise<void> {
  await page.keyboard.type(code, { delay: 2 });
  await page.keyboard.press('Enter');
}

/** The lot that the screen asks for next, or null when everything is in. */
async function lotAskedFor(page: Page): Promise<string | null> {
  await page
    .getByText(/Fetch from bin|Everything is in/)
    .first()
    .waitFor();
  if (await page.getByRole('heading', { name: 'Everything is in' }).isVisible()) return null;
  const words = await page.locator('main').innerText();
  return /\blot\s+(L\d{4}-[A-Z0-9-]+)/.exec(words)?.[1] ?? null;
}

/** Fetches part by part until the tray is full; a handful of the same lot is counted in with one press. */
export async function fillTray(page: Page): Promise<number> {
  let scans = 0;
  for (;;) {
    const code = await lotAskedFor(page);
    if (code === null) return scans;
    await scan(page, code);
    await page
      .getByText(/^Right: /)
      .first()
      .waitFor();
    scans += 1;
    const rest = page.getByRole('button', { name: /^Count \d+ more in$/ });
    if (await rest.isVisible()) await rest.click();
    await page.waitForFunction(
      (before) => !document.querySelector('main')?.textContent?.includes(`lot ${before}`),
      code,
      { timeout: 15_000 },
    );
  }
}

/** A paper as the printer gets it: its text, read by a tool that is not ours. */
export async function paperText(page: Page, path: string): Promise<string> {
  const answer = await page.request.get(path);
  if (!answer.ok()) throw new Error(`${path} answered ${answer.status()}: ${await answer.text()}`);
  const file = join(mkdtempSync(join(tmpdir(), 'coilyard-paper-')), 'paper.pdf');
  writeFileSync(file, await answer.body());
  return execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' });
}
