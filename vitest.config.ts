import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('.', import.meta.url));
const resolve = {
  alias: [
    { find: 'server-only', replacement: `${root}db/server-only.ts` },
    { find: /^@\//, replacement: root },
  ],
};

export default defineConfig({
  test: {
    projects: [
      {
        resolve,
        test: {
          name: 'core',
          include: ['test/{unit,reference,invariants,integration}/**/*.test.{ts,tsx}'],
          pool: 'forks',
          maxWorkers: 2,
          testTimeout: 180_000,
          hookTimeout: 120_000,
        },
      },
      {
        resolve,
        test: {
          name: 'browser',
          include: ['test/browser/**/*.test.ts'],
          globalSetup: ['test/browser/product.ts'],
          pool: 'forks',
          maxWorkers: 1,
          testTimeout: 180_000,
          hookTimeout: 180_000,
        },
      },
    ],
  },
});
