// `npm test`: from a fresh clone to one last line, "N passed, N failed". `--long` adds the long schedules and races.
import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { build, checkNode, findChromium, install, root, run, say, Stop } from '../db/demo/steps.mjs';

const bin = (name) => join(root, 'node_modules/.bin', name);
const isLong = process.argv.includes('--long');
let passed = 0;
let failed = 0;

/** A check that passes or fails as a whole. */
function check(what, command, args) {
  if (run(what, command, args, { env: { ...process.env, NEXT_TELEMETRY_DISABLED: '1' } })) passed += 1;
  else failed += 1;
}

/** A run of the test runner, whose own report is counted. */
function tests(what, project) {
  const report = join(root, 'test/artefacts', `${project}.json`);
  rmSync(report, { force: true });
  const args = ['run', '--project', project, '--reporter=default', '--reporter=json', `--outputFile.json=${report}`];
  // Long schedules take minutes in one test.
  if (isLong) args.push('--testTimeout=3600000');
  const ok = run(what, bin('vitest'), args, {
    env: { ...process.env, ...(isLong && { SCHEDULES: '10000', YARDS: '600' }) },
  });
  if (!existsSync(report)) {
    failed += 1;
    return;
  }
  const { numPassedTests, numFailedTests } = JSON.parse(readFileSync(report, 'utf8'));
  passed += numPassedTests;
  // A file that cannot even be read fails the run without a failed test.
  failed += numFailedTests === 0 && !ok ? 1 : numFailedTests;
}

async function main() {
  const begun = Date.now();
  checkNode();
  process.env.CHROMIUM = findChromium();
  for (const [tool, pack, what] of [
    ['pdftotext', 'poppler-utils', 'printed papers'],
    ['ngspice', 'ngspice', "the receiver's network"],
    ['nec2c', 'nec2c', 'the aerial'],
  ]) {
    if (!existsSync(`/usr/bin/${tool}`)) {
      throw new Stop(`The tests of ${what} need ${tool}. Install it (Debian: apt-get install ${pack}).`);
    }
  }
  mkdirSync(join(root, 'test/artefacts'), { recursive: true });
  install();
  check('Form of the sources', bin('prettier'), ['--check', '--log-level', 'warn', '.']);
  check('Lint', bin('eslint'), ['.', '--max-warnings', '0']);
  check('Route types', bin('next'), ['typegen']);
  check('Types', bin('tsc'), ['--noEmit']);
  check('Nothing unused', bin('knip'), []);
  tests('Rules, formulas, deeds and invariants', 'core');
  let isBuilt = true;
  try {
    build();
    passed += 1;
  } catch (error) {
    if (!(error instanceof Stop)) throw error;
    isBuilt = false;
    failed += 1;
  }
  if (isBuilt) tests('Browser walks against the built product', 'browser');
  say(`All of it took ${Math.round((Date.now() - begun) / 60_000)} minutes`);
  console.log(`${passed} passed, ${failed} failed`);
  process.exit(failed === 0 ? 0 : 1);
}

main().catch((error) => {
  console.error(error instanceof Stop ? `\n${error.message}` : error);
  console.log(`${passed} passed, ${failed + 1} failed`);
  process.exit(1);
});
