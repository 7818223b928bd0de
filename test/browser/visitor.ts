import { mkdirSync, readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { join } from 'node:path';
import { type Browser, type BrowserContext, type Page, chromium } from 'playwright-core';
import { inject } from 'vitest';
import { root } from '../../db/demo/steps.mjs';

const flags = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

export const launch = (): Promise<Browser> =>
  chromium.launch({ executablePath: process.env['CHROMIUM'] ?? '/usr/bin/chromium', args: flags });

export const screens = {
  desktop: { width: 1440, height: 900 },
  tablet: { width: 1024, height: 768 },
  phone: { width: 390, height: 844 },
} as const;
export type Screen = keyof typeof screens;

const axeSource = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');
const tags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'];

interface AxeResult {
  id: string;
  impact: string;
  nodes: { html: string }[];
}

/** One person at one screen: what they see, and every complaint of the browser while they look. */
export class Visitor {
  readonly complaints: string[] = [];

  private constructor(
    readonly page: Page,
    readonly context: BrowserContext,
    private readonly name: string,
  ) {
    page.on('console', (message) => {
      if (message.type() === 'error') this.complaints.push(`${page.url()}: ${message.text()}`);
    });
    page.on('pageerror', (error) => this.complaints.push(`${page.url()}: ${error.message}`));
  }

  static async open(
    browser: Browser,
    name: string,
    options: { screen?: Screen; dark?: boolean; ownPolicy?: boolean } = {},
  ): Promise<Visitor> {
    const context = await browser.newContext({
      viewport: screens[options.screen ?? 'desktop'],
      colorScheme: options.dark ? 'dark' : 'light',
      // axe is evaluated into the page; the page's own policy is tested where the policy is the subject.
      bypassCSP: options.ownPolicy !== true,
      baseURL: inject('url'),
      locale: 'en-GB',
    });
    return new Visitor(await context.newPage(), context, name);
  }

  async go(path: string): Promise<void> {
    await this.page.goto(path);
  }

  /** Until nothing is left to do: the scripts have run, and what a page works out by itself, the verdict say, stands. */
  async settled(): Promise<void> {
    await this.page.evaluate(() => new Promise((idle) => requestIdleCallback(() => requestIdleCallback(idle))));
    if (/^\/bench\/[0-9a-z]{26}$/.test(new URL(this.page.url()).pathname)) {
      await this.page
        .getByText(/^Worked out with/)
        .first()
        .waitFor();
    }
  }

  /** What the browser complained of since this was asked last. */
  takeComplaints(): string[] {
    return this.complaints.splice(0);
  }

  /** Signs in through the page of demo sign-ins, as a person would. */
  async signInAs(person: string): Promise<void> {
    await this.go('/demo');
    await this.page.getByRole('button', { name: new RegExp(`as ${person}`) }).click();
    await this.page.waitForURL((url) => !url.pathname.startsWith('/demo'));
  }

  /** Keeps pictures of what stands on screen, at each width asked for. */
  async picture(subject: string, widths: readonly Screen[] = ['desktop', 'phone']): Promise<void> {
    const folder = join(root, 'test/artefacts/screens');
    mkdirSync(folder, { recursive: true });
    for (const width of widths) {
      await this.page.setViewportSize(screens[width]);
      await this.page.screenshot({ path: join(folder, `${this.name}-${subject}-${width}.png`), fullPage: true });
    }
    await this.page.setViewportSize(screens.desktop);
  }

  /** Violations that axe finds on the page as it stands, a line each. */
  async faults(): Promise<string[]> {
    const { violations } = await this.#axe();
    const { pathname } = new URL(this.page.url());
    return violations.map(({ id, impact, nodes }) => `${pathname}: ${id} (${impact}) ${nodes[0]?.html ?? ''}`);
  }

  /** The rules that axe looked at the page with, whether they found anything or not. */
  async rulesRun(): Promise<string[]> {
    const { violations, passes, inapplicable, incomplete } = await this.#axe();
    return [...violations, ...passes, ...inapplicable, ...incomplete].map(({ id }) => id);
  }

  async #axe(): Promise<Record<'violations' | 'passes' | 'inapplicable' | 'incomplete', AxeResult[]>> {
    await this.page.evaluate(axeSource);
    return this.page.evaluate(async (runOnly) => {
      // `axe` is what the source above has just defined in the page.
      const { axe } = window as unknown as {
        axe: {
          run(options: unknown): Promise<Record<'violations' | 'passes' | 'inapplicable' | 'incomplete', AxeResult[]>>;
        };
      };
      const { violations, passes, inapplicable, incomplete } = await axe.run({ runOnly });
      return { violations, passes, inapplicable, incomplete };
    }, tags);
  }

  /** The page is wider than the screen: something scrolls sideways. */
  sideways(): Promise<boolean> {
    return this.page.evaluate(() => document.documentElement.scrollWidth > document.documentElement.clientWidth);
  }

  async close(): Promise<void> {
    await this.context.close();
  }
}
