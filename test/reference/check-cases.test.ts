import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { judge, readCases } from '@/services/commands/judge-case';

/** Each file carries, case by case, its source and whether the value was published, computed or recalled. */
const FILES = ['receiver.checks.json', 'coils-and-capacitors.checks.json'];

describe.each(FILES)('%s', (file) => {
  const cases = readCases(JSON.parse(readFileSync(new URL(`./${file}`, import.meta.url), 'utf8')));

  test.each(cases)('$id ($quantity) agrees with its source', (check) => {
    const { outcome, got } = judge(check);
    expect({ outcome, got }).toMatchObject({ outcome: 'ok' });
  });

  test('holds cases at all', () => {
    expect(cases.length).toBeGreaterThan(100);
  });
});
