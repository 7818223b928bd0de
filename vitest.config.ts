import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('.', import.meta.url));

export default defineConfig({
  resolve: {
    alias: [
      { find: 'server-only', replacement: `${root}db/server-only.ts` },
      { find: /^@\//, replacement: root },
    ],
  },
  test: {
    include: ['test/{unit,reference,invariants,integration}/**/*.test.{ts,tsx}'],
    pool: 'forks',
    maxWorkers: 2,
    testTimeout: 60_000,
    hookTimeout: 120_000,
  },
});
