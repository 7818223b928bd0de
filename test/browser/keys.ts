import type { Locator, Page } from 'playwright-core';

/** Somebody without a mouse: moves by Tab alone, and notes every stop at which the focus cannot be seen. */
export class Keys {
  readonly faults: string[] = [];

  constructor(readonly page: Page) {}

  /** Tabs on until the focus stands on what is sought. */
  async to(sought: Locator, most = 120): Promise<void> {
    for (let stops = 0; stops < most; stops++) {
      if (await this.standsOn(sought)) return;
      await this.page.keyboard.press('Tab');
      await this.note();
    }
    throw new Error(`${String(sought)} is not reached within ${most} stops.`);
  }

  async standsOn(sought: Locator): Promise<boolean> {
    if ((await sought.count()) === 0) return false;
    return sought.first().evaluate((element) => element === document.activeElement);
  }

  /** Tabs there and presses. */
  async press(sought: Locator, key: 'Enter' | 'Space' = 'Enter'): Promise<void> {
    await this.to(sought);
    await this.page.keyboard.press(key);
  }

  /** Tabs to a field and writes into it, over what stood there. */
  async write(field: Locator, text: string): Promise<void> {
    await this.to(field);
    await this.page.keyboard.press('Control+a');
    await this.page.keyboard.type(text);
  }

  /** Tabs once through the page; what can be worked and was not reached. */
  async unreached(): Promise<string[]> {
    await this.page.evaluate(() => {
      const walk = window as unknown as { reached: Set<Element> }; // kept in the page between two stops
      walk.reached = new Set();
      if (document.activeElement instanceof HTMLElement) document.activeElement.blur();
    });
    for (let stops = 0; stops < 250; stops++) {
      await this.page.keyboard.press('Tab');
      await this.note();
      const isRound = await this.page.evaluate(() => {
        const { reached } = window as unknown as { reached: Set<Element> };
        const { activeElement } = document;
        if (activeElement === null || activeElement === document.body) return reached.size > 0;
        if (reached.has(activeElement)) return true;
        reached.add(activeElement);
        return false;
      });
      if (isRound) return this.page.evaluate(operableButNotReached);
    }
    return ['The focus goes round for more than 250 stops.'];
  }

  private async note(): Promise<void> {
    const fault = await this.page.evaluate(focusFault);
    if (fault !== null) this.faults.push(`${new URL(this.page.url()).pathname}: ${fault}`);
  }
}

/** In the page: everything that can be worked, is in sight, and was not among the stops. */
function operableButNotReached(): string[] {
  const { reached } = window as unknown as { reached: Set<Element> };
  const operable = 'a[href], button, input, select, textarea, summary, [tabindex="0"]';
  return [...document.querySelectorAll<HTMLElement>(operable)]
    .filter((element) => {
      if (element.matches(':disabled, [tabindex="-1"], [type="hidden"]') || !element.checkVisibility()) return false;
      // One stop a radio group: its chosen one.
      if (element instanceof HTMLInputElement && element.type === 'radio' && !element.checked) return false;
      return !reached.has(element);
    })
    .map((element) => element.outerHTML.slice(0, 160));
}

/** In the page: what is wrong with how the focus is shown, or null. */
function focusFault(): string | null {
  const focused = document.activeElement;
  if (!(focused instanceof HTMLElement || focused instanceof SVGElement) || focused === document.body) return null;
  const named = focused.outerHTML.slice(0, 140);

  let ringed: Element | null = focused;
  for (let up = 0; up < 5 && ringed; up++, ringed = ringed.parentElement) {
    const { outlineStyle, outlineWidth } = getComputedStyle(ringed);
    if (outlineStyle !== 'none' && parseFloat(outlineWidth) >= 2) break;
  }
  if (!ringed || ringed === document.documentElement) return `no ring on ${named}`;

  const look = getComputedStyle(ringed);
  const width = parseFloat(look.outlineWidth);
  const offset = parseFloat(look.outlineOffset);
  const inside = offset < 0;

  const channels = (colour: string) => (colour.match(/[\d.]+/g) ?? []).map(Number);
  const groundOf = (element: Element | null): number[] => {
    for (let at = element; at; at = at.parentElement) {
      const colour = channels(getComputedStyle(at).backgroundColor);
      if ((colour[3] ?? 1) > 0.9) return colour;
    }
    return [255, 255, 255];
  };
  const luminance = (colour: number[]) => {
    const [r = 0, g = 0, b = 0] = colour.map((channel) => {
      const share = channel / 255;
      return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
    });
    return 0.2126 * r + 0.7152 * g + 0.0722 * b;
  };
  const ring = luminance(channels(look.outlineColor));
  const ground = luminance(groundOf(inside ? ringed : ringed.parentElement));
  const contrast = (Math.max(ring, ground) + 0.05) / (Math.min(ring, ground) + 0.05);
  if (contrast < 3) return `a ring of ${contrast.toFixed(1)} to 1 on ${named}`;

  const box = ringed.getBoundingClientRect();
  const grow = inside ? 0 : width + offset - 1;
  for (let at = ringed.parentElement; at && at !== document.body; at = at.parentElement) {
    if (getComputedStyle(at).overflow === 'visible') continue;
    const frame = at.getBoundingClientRect();
    const isCut =
      box.left - grow < frame.left ||
      box.right + grow > frame.right ||
      (box.top - grow < frame.top && box.bottom < frame.bottom) ||
      (box.bottom + grow > frame.bottom && box.top > frame.top);
    if (isCut) return `a ring that is cut off on ${named}`;
  }

  const seen = focused.getBoundingClientRect();
  const [x, y] = [seen.left + seen.width / 2, seen.top + Math.min(seen.height, 60) / 2];
  if (x < 0 || y < 0 || x > innerWidth || y > innerHeight) return `out of sight: ${named}`;
  const top = document.elementFromPoint(x, y);
  const label = focused instanceof HTMLInputElement ? (focused.labels?.[0] ?? null) : null;
  if (top && !focused.contains(top) && !top.contains(focused) && !label?.contains(top)) {
    return `under ${top.outerHTML.slice(0, 80)}: ${named}`;
  }
  return null;
}
