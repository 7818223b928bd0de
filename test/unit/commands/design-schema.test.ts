import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { Design } from '@/services/receiver';
import { designSchemaText } from '@/services/commands/design-schema';
import { aSet, aSolenoid } from '../receiver/builders';
import { nearDesign } from '../receiver/near-design';

const ROOT = new URL('../../../', import.meta.url).pathname;
const written = readFileSync(join(ROOT, 'public/design.schema.json'), 'utf8');
const schema: unknown = JSON.parse(written);

function keyed(value: unknown): Record<string, unknown> {
  return value !== null && typeof value === 'object' && !Array.isArray(value) ? { ...value } : {};
}

const listed = (value: unknown): unknown[] => (Array.isArray(value) ? value : []);

const KINDS: Record<string, (value: unknown) => boolean> = {
  object: (value) => value !== null && typeof value === 'object' && !Array.isArray(value),
  array: Array.isArray,
  string: (value) => typeof value === 'string',
  number: (value) => typeof value === 'number',
  integer: Number.isInteger,
  boolean: (value) => typeof value === 'boolean',
};

/** What each keyword asks; a keyword that is not here fails the test that lists them. */
const KEYWORDS: Record<string, (asked: unknown, value: unknown, rule: Record<string, unknown>) => boolean> = {
  type: (asked, value) => KINDS[String(asked)]?.(value) ?? false,
  const: (asked, value) => asked === value,
  enum: (asked, value) => listed(asked).includes(value),
  minimum: (asked, value) => Number(value) >= Number(asked),
  maximum: (asked, value) => Number(value) <= Number(asked),
  exclusiveMinimum: (asked, value) => Number(value) > Number(asked),
  maxLength: (asked, value) => String(value).length <= Number(asked),
  minItems: (asked, value) => listed(value).length >= Number(asked),
  maxItems: (asked, value) => listed(value).length <= Number(asked),
  required: (asked, value) => listed(asked).every((key) => Object.hasOwn(keyed(value), String(key))),
  properties: (asked, value) =>
    Object.entries(keyed(value)).every(([key, item]) => !(key in keyed(asked)) || holds(keyed(asked)[key], item)),
  additionalProperties: (_asked, value, rule) =>
    Object.keys(keyed(value)).every((key) => Object.hasOwn(keyed(rule['properties']), key)),
  prefixItems: (asked, value) => listed(asked).every((each, i) => holds(each, listed(value)[i])),
  items: (asked, value) => asked === false || listed(value).every((item) => holds(asked, item)),
  anyOf: (asked, value) => listed(asked).some((each) => holds(each, value)),
  oneOf: (asked, value) => listed(asked).filter((each) => holds(each, value)).length === 1,
};
const WORDS = new Set(['$schema', '$id', 'title', 'description', 'default']);

function holds(rule: unknown, value: unknown): boolean {
  const all = keyed(rule);
  return Object.entries(all).every(
    ([keyword, asked]) => WORDS.has(keyword) || (KEYWORDS[keyword]?.(asked, value, all) ?? false),
  );
}

describe('the JSON Schema of the design file', () => {
  test('is what the schema that reads designs gives today: npm run -s schema writes it', () => {
    expect(written).toBe(designSchemaText());
  });

  test('has an identifier that holds wherever the file is served, and names itself', () => {
    expect(schema).toMatchObject({ $id: 'design.schema.json', type: 'object', additionalProperties: false });
  });

  test.each(readdirSync(join(ROOT, 'test/reference/designs')))('lets the worked design %s through', (name) => {
    expect(holds(schema, JSON.parse(readFileSync(join(ROOT, 'test/reference/designs', name), 'utf8')))).toBe(true);
  });

  test('lets through what the evaluation lets through', () => {
    fc.assert(fc.property(nearDesign, (design) => holds(schema, JSON.parse(JSON.stringify(design)))));
  });

  test.each([
    ['a key that is no part of the form', { ...aSet(), colour: 'red' }],
    ['a missing band', { ...aSet(), band: undefined }],
    ['a coil of no kind', { ...aSet(), coil: { kind: 'bobbin', l: 2e-4, q: 100 } }],
    ['half a turn', { ...aSet(), coil: { ...aSolenoid, turns: 72.5 } }],
    ['a stray of a microfarad', { ...aSet(), stray: 1e-6 }],
    ['a spread without its width', { ...aSet(), stray: { nominal: 4e-12 } }],
    ['a text for a number', { ...aSet(), temperature: 'warm' }],
  ])('stops %s, as the evaluation does', (_what, design) => {
    const file: unknown = JSON.parse(JSON.stringify(design));
    expect([holds(schema, file), Design.safeParse(file).success]).toEqual([false, false]);
  });
});
