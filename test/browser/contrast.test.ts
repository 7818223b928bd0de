import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { everybody, pages, pathOf, people } from './pages';
import { Visitor, launch } from './visitor';

/**
 * Every text node of every page against the ground it stands on: 7 to 1 at least, 4.5 to 1 for meta in ink3 and for
 * what is locked or waits. The token tables say what the colours are; this says that pages pair them rightly.
 */
let browser: Browser;
beforeAll(async () => {
  browser = await launch();
});
afterAll(async () => {
  await browser.close();
});

interface Faint {
  ratio: number;
  needed: number;
  text: string;
  look: string;
}

/** In the page: the texts that are fainter than they may be. */
function faintTexts(): Faint[] {
  type Colour = [red: number, green: number, blue: number, alpha: number];
  const canvas = document.createElement('canvas').getContext('2d', { willReadFrequently: true });
  const known = new Map<string, Colour>();
  const colourOf = (css: string): Colour => {
    const before = known.get(css);
    if (before) return before;
    let colour: Colour = [0, 0, 0, 0];
    if (canvas) {
      canvas.clearRect(0, 0, 1, 1);
      canvas.fillStyle = css;
      canvas.fillRect(0, 0, 1, 1);
      const [red = 0, green = 0, blue = 0, alpha = 0] = canvas.getImageData(0, 0, 1, 1).data;
      colour = [red, green, blue, alpha / 255];
    }
    known.set(css, colour);
    return colour;
  };
  const over = (top: Colour, under: Colour, alpha = top[3]): Colour => [
    top[0] * alpha + under[0] * (1 - alpha),
    top[1] * alpha + under[1] * (1 - alpha),
    top[2] * alpha + under[2] * (1 - alpha),
    1,
  ];
  const luminance = (colour: Colour) => {
    const [red = 0, green = 0, blue = 0] = colour.slice(0, 3).map((channel) => {
      const share = channel / 255;
      return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
    });
    return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
  };
  const white: Colour = [255, 255, 255, 1];
  const groundOf = (element: Element | null): Colour => {
    if (!element) return white;
    const colour = colourOf(getComputedStyle(element).backgroundColor);
    return colour[3] >= 0.995 ? colour : over(colour, groundOf(element.parentElement));
  };
  /** What of the element's own paint is left over its ground. */
  const opacityOf = (element: Element | null): number =>
    element ? Number(getComputedStyle(element).opacity) * opacityOf(element.parentElement) : 1;
  /** A word in a drawing stands on the painted shape under its middle, if there is one. */
  const shapeUnder = (word: Element, x: number, y: number): Colour | null => {
    for (const shape of document.elementsFromPoint(x, y)) {
      if (shape === word || word.contains(shape) || shape.contains(word)) continue;
      if (!(shape instanceof SVGGeometryElement)) return null;
      const { fill } = getComputedStyle(shape);
      if (fill.startsWith('url')) continue;
      const colour = colourOf(fill);
      if (fill !== 'none' && colour[3] > 0.9) return colour;
    }
    return null;
  };

  const ink3 = getComputedStyle(document.querySelector('[data-theme]') ?? document.body).getPropertyValue('--ink3');
  const [meta] = [colourOf(ink3)];
  const faint: Faint[] = [];
  const walker = document.createTreeWalker(document.body, NodeFilter.SHOW_TEXT);
  for (let node = walker.nextNode(); node; node = walker.nextNode()) {
    const text = (node.textContent ?? '').trim();
    const element = node.parentElement;
    if (text === '' || !element || !element.checkVisibility({ visibilityProperty: true })) continue;
    if (element.closest('script, style, noscript, template, title, option')) continue;
    const range = document.createRange();
    range.selectNodeContents(node);
    const box = range.getBoundingClientRect();
    // Words for readers only are one pixel large.
    if (box.width < 2 || box.height < 2 || element.closest('.sr-only')) continue;

    const look = getComputedStyle(element);
    const svg = element.closest('svg');
    const ground = groundOf(svg ? svg.parentElement : element);
    const stand = (svg && shapeUnder(element, box.x + box.width / 2, box.y + box.height / 2)) ?? ground;
    const own = colourOf(svg ? look.fill : look.color);
    const seen = over(own, stand, own[3] * opacityOf(element));
    const [a, b] = [luminance(seen), luminance(stand)];
    const ratio = (Math.max(a, b) + 0.05) / (Math.min(a, b) + 0.05);
    const isLocked = element.closest('[aria-disabled="true"], :disabled, [data-state="waiting"]') !== null;
    const needed = isLocked || own.join() === meta.join() ? 4.5 : 7;
    // Two figures are computed apart and rounded once: 6.995 is 7.00.
    if (ratio < needed - 0.005) {
      faint.push({
        ratio: Math.round(ratio * 100) / 100,
        needed,
        text: text.slice(0, 60),
        look: element.className.toString().slice(0, 80),
      });
    }
  }
  return faint;
}

/** Each page once: as the first of those who may see it, and again in the dark where it follows the system. */
const looks = everybody.flatMap((who) => {
  const theirs = pages.filter((page) => page.who[0] === who);
  const dark = theirs.filter((page) => page.dark);
  const light = { who, scheme: 'light' as const, paths: theirs.map(({ path }) => path) };
  return dark.length === 0 ? [light] : [light, { who, scheme: 'dark' as const, paths: dark.map(({ path }) => path) }];
});

test.each(looks)('as $who, no text is faint in the $scheme', async ({ who, scheme, paths }) => {
  const visitor = await Visitor.open(browser, 'contrast', { dark: scheme === 'dark' });
  const { page } = visitor;
  const person = people[who];
  if (person !== null) await visitor.signInAs(person);
  // Tall, so that everything is on the screen, where what lies under a word can be asked for.
  await page.setViewportSize({ width: 1440, height: 4000 });
  const faint: Record<string, Faint[]> = {};
  for (const path of paths) {
    await visitor.go(await pathOf(path));
    await visitor.settled();
    const found = await page.evaluate(faintTexts);
    if (found.length > 0) faint[path] = found;
  }
  expect(faint).toEqual({});
  await visitor.close();
});
