import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';

const ROOT = new URL('../../../services/receiver/', import.meta.url).pathname;

const sources = readdirSync(ROOT, { recursive: true, encoding: 'utf8' })
  .filter((name) => name.endsWith('.ts'))
  .map((name) => ({ name, text: withoutComments(readFileSync(join(ROOT, name), 'utf8')) }));

function withoutComments(text: string): string {
  return text.replace(/\/\*[\s\S]*?\*\//g, '').replace(/(^|[^:'"])\/\/.*$/gm, '$1');
}

/** Whatever ECMAScript defines to the last digit; the rest of Math differs between engines. */
const EXACT = ['abs', 'ceil', 'floor', 'fround', 'imul', 'max', 'min', 'round', 'sign', 'sqrt', 'trunc'];

describe('the engine stays pure', () => {
  test('it has sources to look at', () => {
    expect(sources.length).toBeGreaterThan(40);
  });

  test.each(sources)('$name uses only the parts of Math that are exact everywhere', ({ text }) => {
    const used = [...text.matchAll(/\bMath\s*(?:\.\s*(\w+)|\[)/g)].map((match) => match[1] ?? '[');
    expect(used.filter((member) => !EXACT.includes(member))).toEqual([]);
    expect(text).not.toMatch(/\*\*/);
    expect(text).not.toMatch(/=\s*Math\b(?!\s*[.[])/);
  });

  test.each(sources)('$name imports only the engine itself and zod', ({ text }) => {
    const from = [...text.matchAll(/(?:\bfrom|\bimport)\s*\(?\s*['"]([^'"]+)['"]/g)].map((match) => match[1] ?? '');
    expect(from.filter((module) => module !== 'zod' && !module.startsWith('./') && !module.startsWith('../'))).toEqual(
      [],
    );
  });

  test.each(sources)('$name reaches for no clock, chance, locale, network or process', ({ text }) => {
    expect(text).not.toMatch(
      /\b(Date|process|window|document|globalThis|fetch|crypto|performance|Intl|toLocale\w*|localeCompare)\b/,
    );
    expect(text).not.toMatch(/Math\.random|require\(/);
  });
});
