import { spawnSync } from 'node:child_process';
import fc from 'fast-check';
import { evaluate, InvalidInput, type DesignInput } from '@/services/receiver';
import { anyDesign } from '../unit/receiver/any-design';
import { nearDesign } from '../unit/receiver/near-design';
import { aSet, aSolenoid } from '../unit/receiver/builders';
import { cpuSeconds, heading, line, median, quantile } from './measure';

const DESIGNS = 150;
const SEED = 7;

/** A kit as the workbench writes it: wound coil with its tolerance, wire aerial, capacitor of stock. */
const aKit = aSet({
  aerial: { kind: 'wire', vertical: 6, horizontal: 12, radius: 0.0005, siteFactor: { nominal: 1.1, tol: 0.18 } },
  earth: { kind: 'resistance', r: { nominal: 50, tol: 1, dist: 'log-uniform' } },
  coil: { ...aSolenoid, lFactor: { nominal: 1, tol: 0.04, dist: 'normal' } },
  tuning: {
    kind: 'capacitor',
    min: { nominal: 1.2e-11, tol: 0.2 },
    max: { nominal: 5e-10, tol: 0.1 },
    law: 'capacitance',
  },
  stray: { nominal: 1e-11, tol: 0.5 },
});

function milliseconds(designs: readonly DesignInput[], boxes: number): number[] {
  return designs.flatMap((design) => {
    try {
      return [1000 * cpuSeconds(() => evaluate(design, { boxes }))];
    } catch (error) {
      if (error instanceof InvalidInput) return [];
      throw error;
    }
  });
}

const shown = (times: readonly number[]): string =>
  `${median(times).toFixed(1)} ms, 9 of 10 under ${quantile(times, 0.9).toFixed(1)} ms`;

export function verdictBenchmarks(): void {
  heading('Verdicts, processor time');
  const kit = Array.from({ length: 15 }, () => aKit);
  milliseconds(kit, 0);
  line("a kit's first verdict at a keystroke, no boxes", `${median(milliseconds(kit, 0)).toFixed(1)} ms`);
  line('the same with 2,000 boxes', `${median(milliseconds(kit, 2000)).toFixed(1)} ms`);
  line('the same with 20,000 boxes', `${median(milliseconds(kit, 20000)).toFixed(1)} ms`);
  line(
    'random sets that just about work, first verdict',
    shown(milliseconds(fc.sample(nearDesign, { numRuns: DESIGNS, seed: SEED }), 0)),
  );
  line(
    'random sets, most of them hopeless, first verdict',
    shown(milliseconds(fc.sample(anyDesign, { numRuns: DESIGNS, seed: SEED }), 0)),
  );
}

const STARTS = 7;

/** Wall time of a command, median. */
function started(words: readonly string[]): number {
  const times = Array.from({ length: STARTS }, () => {
    const begun = process.hrtime.bigint();
    spawnSync('npm', ['run', '-s', ...words], { encoding: 'utf8' });
    return Number(process.hrtime.bigint() - begun) / 1e6;
  });
  return median(times);
}

export function startBenchmarks(): void {
  heading('Command, wall time');
  const bare = started([]);
  const evaluated = started(['evaluate', '--', 'test/reference/designs/clears-series.json']);
  line(
    'npm run -s evaluate over a bare npm run -s',
    `${(evaluated - bare).toFixed(0)} ms`,
    `${bare.toFixed(0)} ms bare; below 500 ms is asked`,
  );
}
