// `npm run bench`: bundles the benchmarks as the product bundles its engine, then runs them with the collector at hand.
import { spawnSync } from 'node:child_process';
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const root = fileURLToPath(new URL('../../', import.meta.url));
const folder = join(root, 'node_modules/.cache/coilyard');
const outfile = join(folder, 'bench.mjs');
mkdirSync(folder, { recursive: true });
await build({
  entryPoints: [join(root, 'test/benchmarks/main.ts')],
  outfile,
  bundle: true,
  platform: 'node',
  format: 'esm',
  target: 'node20',
  alias: { '@': root.replace(/\/$/, '') },
  logLevel: 'error',
});
const { status } = spawnSync(process.execPath, ['--expose-gc', outfile, ...process.argv.slice(2)], {
  cwd: root,
  stdio: 'inherit',
});
process.exitCode = status ?? 1;
