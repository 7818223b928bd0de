import { readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { root } from '../../db/demo/steps.mjs';

function filesUnder(folder: string): string[] {
  return readdirSync(join(root, folder), { withFileTypes: true }).flatMap((entry) =>
    entry.isDirectory() ? filesUnder(join(folder, entry.name)) : [join(folder, entry.name)],
  );
}
const read = (file: string) => readFileSync(join(root, file), 'utf8');
const sources = (folder: string) => filesUnder(folder).filter((file) => /\.tsx?$/.test(file));

const domains = readdirSync(join(root, 'services'), { withFileTypes: true })
  .filter(
    (entry) => entry.isDirectory() && !['receiver', 'worker', 'commands', 'record', 'access'].includes(entry.name),
  )
  .map((entry) => entry.name);

/** Files that open a transaction without `must` or `record` of their own, and why that is right. */
const exempt: Record<string, string> = {
  'services/payments/cancel-order.ts': 'orders.openOrder asks, and orders.cancel writes it down',
  'services/payments/receive-event.ts': 'the deeds of orders that it applies write down what changed',
  'services/payments/reconcile.ts': 'the deeds of orders that it applies write down what changed',
  'services/payments/start-checkout.ts': 'orders.openOrder asks, and orders.openAttempt writes it down',
  'services/orders/change-basket.ts': 'a basket is a visitor’s scratch paper until it becomes an order',
};

describe('the shape of the code', () => {
  const deeds = domains
    .flatMap((domain) => sources(`services/${domain}`))
    .filter((file) => /\bawait write\(|return write\(/.test(read(file)));

  test('there are deeds to look at', () => {
    expect(deeds.length).toBeGreaterThan(20);
  });

  test.each(deeds)('%s asks who may and writes down what changed', (file) => {
    if (exempt[file]) return;
    const text = read(file);
    expect(text, 'calls must').toMatch(/\bmust\(/);
    expect(text, 'calls record').toMatch(/\brecord\(/);
  });

  test('each domain keeps its door out of the browser', () => {
    for (const domain of domains) {
      const doors = sources(`services/${domain}`).filter((file) => file.endsWith('/index.ts'));
      for (const door of doors) expect(read(door), door).toMatch(/^import 'server-only';/);
    }
  });

  test('no element carries a style attribute, which the content policy would drop', () => {
    for (const file of [...sources('app'), ...sources('components'), ...sources('templates/drawings')]) {
      // react-pdf has a `style` of its own, which never becomes HTML.
      if (file.endsWith('as-pdf.tsx')) continue;
      expect(read(file), file).not.toMatch(/\sstyle=\{/);
    }
  });

  test('raw SQL stands in the dialect and in migrations only', () => {
    const where = ['app', 'components', 'services', 'templates']
      .flatMap(sources)
      .filter((file) => /\.raw\(/.test(read(file)));
    expect(where.filter((file) => !file.startsWith('services/commands/'))).toEqual([]);
  });

  test('every migration has a way down', () => {
    for (const file of sources('db/migrations').filter((name) => !name.endsWith('index.ts'))) {
      expect(read(file), file).toMatch(/export async function down/);
    }
  });
});
