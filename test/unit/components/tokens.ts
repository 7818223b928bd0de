import { readFileSync } from 'node:fs';

export type Theme = 'light' | 'dark';

const css = readFileSync(new URL('../../../app/globals.css', import.meta.url), 'utf8');

/** Reads the colour tokens of one theme from app/globals.css, as the browser would take them. */
export function tokensOf(theme: Theme): Map<string, string> {
  const selector =
    theme === 'light' ? /:root,\s*\[data-theme='light'\] \{([^}]*)\}/ : /\[data-theme='auto'\] \{([^}]*--paper[^}]*)\}/;
  const block = selector.exec(css)?.[1];
  if (block === undefined) throw new Error(`No ${theme} tokens in app/globals.css`);
  return new Map(
    [...block.matchAll(/--([a-z0-9-]+):\s*(#[0-9a-f]{6});/g)].map((match) => [match[1] ?? '', match[2] ?? '']),
  );
}

/** Contrast of two colours by the WCAG 2 relative luminance. */
export function contrast(a: string, b: string): number {
  const [light, dark] = [luminance(a), luminance(b)].sort((x, y) => y - x);
  return ((light ?? 0) + 0.05) / ((dark ?? 0) + 0.05);
}

function luminance(colour: string): number {
  const part = (from: number) => {
    const value = Number.parseInt(colour.slice(from, from + 2), 16) / 255;
    return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
  };
  return 0.2126 * part(1) + 0.7152 * part(3) + 0.0722 * part(5);
}
