import { readFileSync } from 'node:fs';
import { judge, readCases } from './judge-case';

/** `npm run -s cases -- FILE...`: a line a case, `ok`, `off` or `unknown`, identifier, value got and value expected. */
function main(files: readonly string[]): number {
  if (files.length === 0) {
    process.stderr.write('Name at least one file of check cases.\n');
    return 2;
  }
  let allOk = true;
  for (const file of files) {
    let cases;
    try {
      cases = readCases(JSON.parse(readFileSync(file, 'utf8')));
    } catch (error) {
      process.stderr.write(
        `${file} cannot be read as check cases: ${error instanceof Error ? error.message : String(error)}\n`,
      );
      return 2;
    }
    for (const check of cases) {
      const { outcome, got } = judge(check);
      if (outcome !== 'ok') allOk = false;
      process.stdout.write(`${outcome} ${check.id} ${JSON.stringify(got)} ${JSON.stringify(check.expected)}\n`);
    }
  }
  return allOk ? 0 : 1;
}

process.exitCode = main(process.argv.slice(2));
