import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

/** Programs of Debian that the engine is checked against, by their packages. */
const PACKAGES = { ngspice: 'ngspice', nec2c: 'nec2c' } as const;
export type Program = keyof typeof PACKAGES;

export interface Run {
  /** What the program wrote to standard output. */
  output: string;
  /** Text of a file the program left in its folder. */
  file(name: string): string;
}

/** Runs a program on files in a folder of its own; says what to install where it is missing. */
export function runOn<T>(
  program: Program,
  args: readonly string[],
  files: Readonly<Record<string, string>>,
  read: (run: Run) => T,
): T {
  const folder = mkdtempSync(join(tmpdir(), `coilyard-${program}-`));
  try {
    for (const [name, text] of Object.entries(files)) writeFileSync(join(folder, name), text);
    const { stdout, stderr, error, status } = spawnSync(program, args, {
      cwd: folder,
      encoding: 'utf8',
      maxBuffer: 1 << 28,
    });
    if (error !== undefined && 'code' in error && error.code === 'ENOENT') {
      throw new Error(
        `The engine is checked against ${program}, which is not installed. Install it (Debian: apt-get install ${PACKAGES[program]}).`,
      );
    }
    if (error !== undefined) throw error;
    if (status !== 0) throw new Error(`${program} ended with ${String(status)}: ${(stderr || stdout).slice(-2000)}`);
    return read({ output: stdout, file: (name) => readFileSync(join(folder, name), 'utf8') });
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}
