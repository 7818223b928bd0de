// Starts a command of the engine from one bundled file: reading a hundred sources anew takes most of a second.
// `node services/commands/start.mjs evaluate FILE`. The bundle is made at first use and again when a source has changed.
import { createHash } from 'node:crypto';
import {
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  renameSync,
  rmSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';

const root = fileURLToPath(new URL('../../', import.meta.url));
const commands = ['evaluate', 'cases'];

/** Everything a bundle is made of: the engine, the commands, and the versions of what they are made with. */
function key() {
  const hash = createHash('sha256').update(process.version);
  const add = (file) => hash.update(file).update(readFileSync(join(root, file)));
  for (const folder of ['services/receiver', 'services/commands']) {
    const files = readdirSync(join(root, folder), { recursive: true });
    for (const file of files.sort()) if (/\.m?ts$|\.mjs$/.test(file)) add(join(folder, file));
  }
  for (const name of ['zod', 'esbuild']) add(`node_modules/${name}/package.json`);
  return hash.digest('hex').slice(0, 16);
}

async function bundle(command) {
  const { build } = await import('esbuild');
  const made = await build({
    entryPoints: [join(root, `services/commands/${command}.ts`)],
    bundle: true,
    write: false,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    minifyWhitespace: true,
    legalComments: 'none',
    logLevel: 'error',
  });
  return made.outputFiles[0].contents;
}

/** Writes under another name first: two first uses at once must not read half a file. */
function keep(folder, file, contents) {
  const own = join(folder, `.${process.pid}-${file}`);
  writeFileSync(own, contents);
  renameSync(own, join(folder, file));
}

async function main() {
  const command = process.argv[2] ?? '';
  if (!commands.includes(command)) {
    process.stderr.write(`Name one of the commands: ${commands.join(', ')}.\n`);
    process.exitCode = 2;
    return;
  }
  const folder = join(root, 'node_modules/.cache/coilyard');
  const file = `${command}-${key()}.mjs`;
  let found = join(folder, file);
  let passing = null;
  if (!existsSync(found)) {
    const contents = await bundle(command);
    try {
      mkdirSync(folder, { recursive: true });
      for (const old of readdirSync(folder))
        if (old.startsWith(`${command}-`)) rmSync(join(folder, old), { force: true });
      keep(folder, file, contents);
    } catch {
      // A checkout that may not be written to still has its commands, only slower.
      passing = mkdtempSync(join(tmpdir(), 'coilyard-'));
      keep(passing, file, contents);
      found = join(passing, file);
    }
  }
  // The command reads its own words from the third on.
  process.argv.splice(2, 1);
  await import(pathToFileURL(found).href);
  if (passing !== null) rmSync(passing, { recursive: true, force: true });
}

await main();
