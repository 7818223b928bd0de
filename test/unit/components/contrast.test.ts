import { describe, expect, it } from 'vitest';
import { contrast, tokensOf, type Theme } from './tokens';

const grounds = ['paper', 'card', 'well'];
const texts = ['ink', 'ink2', 'enamel', 'copper-ink', 'pine', 'ochre', 'crimson'];
const washes = ['enamel-wash', 'copper-wash', 'pine-wash', 'ochre-wash', 'crimson-wash'];

/** Text on its ground, with the least ratio asked for. */
function textPairs(theme: Theme): [text: string, ground: string, least: number][] {
  return [
    ...texts.flatMap((text) => grounds.map((ground): [string, string, number] => [text, ground, 7])),
    ...grounds.map((ground): [string, string, number] => ['ink3', ground, 4.5]),
    ...['ink', 'ink2'].flatMap((text) => washes.map((wash): [string, string, number] => [text, wash, 7])),
    ...['copper', 'pine', 'ochre', 'crimson'].map((hue): [string, string, number] => [
      hue === 'copper' ? 'copper-ink' : hue,
      `${hue}-wash`,
      7,
    ]),
    ...(theme === 'light' ? ([['enamel', 'enamel-wash', 7]] satisfies [string, string, number][]) : []),
    ['on-enamel', 'plate', 7],
    ['on-enamel', 'plate-deep', 7],
    ['on-enamel2', 'plate', 7],
    ['on-enamel2', 'plate-deep', 7],
    ['on-deep2', 'plate-deep', 7],
    ['paper', 'ink', 7],
    ['toast-link', 'ink', 7],
  ];
}

const graphics: [drawn: string, ground: string][] = [
  ...['copper', 'edge', 'enamel', 'ink', 'pine', 'crimson', 'ochre'].flatMap((drawn) =>
    grounds.map((ground): [string, string] => [drawn, ground]),
  ),
  ['on-enamel-copper', 'plate'],
  ['on-enamel-copper', 'plate-deep'],
  ['on-enamel', 'plate'],
];

describe.each<Theme>(['light', 'dark'])('in the %s theme', (theme) => {
  const tokens = tokensOf(theme);
  const colour = (name: string) => tokens.get(name) ?? expect.fail(`no token ${name}`);

  it.each(textPairs(theme))('%s can be read on %s at %d to 1', (text, ground, least) => {
    expect(contrast(colour(text), colour(ground))).toBeGreaterThanOrEqual(least);
  });

  it.each(graphics)('a line in %s is seen on %s', (drawn, ground) => {
    expect(contrast(colour(drawn), colour(ground))).toBeGreaterThanOrEqual(3);
  });
});

describe('the two themes', () => {
  it('name the same colours', () => {
    expect([...tokensOf('dark').keys()].sort()).toEqual([...tokensOf('light').keys()].sort());
  });

  it('differ in their ground', () => {
    expect(tokensOf('dark').get('paper')).not.toBe(tokensOf('light').get('paper'));
  });
});
