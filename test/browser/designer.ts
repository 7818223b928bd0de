import type { Page } from 'playwright-core';

/** What a designer does on the Bench, by the words on the screen. */
export interface DrawnKit {
  name: string;
  number: number;
  code: string;
}

export async function startKit(page: Page, { name, number, code }: DrawnKit): Promise<void> {
  await page.goto('/bench/kits/new');
  await page.getByLabel('Name', { exact: false }).first().fill(name);
  await page.getByLabel('Number').fill(String(number));
  await page.getByLabel('Code').fill(code);
  await page.getByLabel('What it is').fill('A set for the quay: one coil, one capacitor, one evening.');
  await page.getByLabel('Who it is for').fill('Families by the water');
  await page.getByLabel('Age from').fill('10');
  await page.getByRole('button', { name: 'Start the kit' }).click();
  await page.waitForURL(/\/bench\/[0-9a-z]{26}$/);
}

/** Adds a line in a group of the bill of materials; `place` where the group has several. */
export async function addLine(page: Page, group: string, part: string, place?: string): Promise<void> {
  const section = page.getByRole('region', { name: group, exact: true });
  await section.getByRole('button', { name: 'Add a line' }).click();
  if (place !== undefined) await section.getByRole('button', { name: place, exact: true }).click();
  const search = section.getByPlaceholder('Code or name');
  await search.fill(part);
  const option = page.getByRole('option', { name: new RegExp(`^${part} `) }).first();
  await option.click();
  await section
    .getByRole('button', { name: new RegExp(`^Change line`) })
    .last()
    .waitFor();
  await saved(page);
}

/** Waits until what was typed stands in the database. */
export async function saved(page: Page): Promise<void> {
  await page.getByText(/^Saved \d/).waitFor();
}

export async function setNumber(page: Page, label: string, value: string): Promise<void> {
  const field = page.getByRole('textbox', { name: label, exact: true });
  await field.fill(value);
  await field.press('Tab');
  await saved(page);
}

/** Writes a guide of one step that uses every line, with every caution. */
export async function writeGuide(page: Page): Promise<void> {
  await page.getByRole('link', { name: 'Build guide' }).click();
  await page.waitForURL(/\/guide$/);
  await page
    .getByLabel('Introduction', { exact: true })
    .fill('A set that runs on the signal itself. Read each step to its end first.');
  await page.getByRole('button', { name: 'Add a step' }).click();
  await page.getByLabel('Title').fill('Wind, fit and listen');
  await page
    .getByLabel('What to do')
    .fill('Wind the coil, fit the parts to the board, hang the wire, and turn the knob slowly.');
  const uses = page.getByRole('group', { name: 'Lines that step 1 uses' }).getByRole('button');
  for (const button of await uses.all()) await button.click();
  for (const box of await page.getByRole('checkbox').all()) await box.check();
  await page.getByText('The guide is complete').waitFor();
  await saved(page);
}
