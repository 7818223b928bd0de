import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { evaluate, type DesignInput } from '@/services/receiver';
import { voltagePerEmf } from '@/services/receiver/network/solve';
import { parseDesign } from '@/services/receiver/parse';
import { prepared } from '@/services/receiver/survey';
import { netlistOf, type Netlist } from '../reference/outside/netlist';
import { aSet, aSolenoid } from '../unit/receiver/builders';
import { heading, line, median, rates, thousands } from './measure';

const F = 1e6;
const TUNED = 1e-10;
const CHANGES = 20000;
const POINTS = 200000;
const RUNS = 5;

/** Processor seconds of ngspice on a script, and what it printed. */
function spice(netlist: Netlist, script: readonly string[]): { seconds: number; output: string } {
  const folder = mkdtempSync(join(tmpdir(), 'coilyard-bench-'));
  try {
    writeFileSync(join(folder, 'set.cir'), netlist.text);
    const lines = ['* bench', '.control', 'set numdgt=12', 'source set.cir', ...script, 'quit', '.endc', '.end', ''];
    writeFileSync(join(folder, 'all.cir'), lines.join('\n'));
    const { stdout, stderr, status } = spawnSync(
      'bash',
      ['-c', 'TIMEFORMAT="seconds %U %S"; time ngspice -b all.cir 2>&1'],
      { cwd: folder, encoding: 'utf8', maxBuffer: 1 << 28 },
    );
    const times = /seconds (\S+) (\S+)/.exec(stderr);
    if (status !== 0 || times === null) throw new Error(`ngspice ended with ${String(status)}: ${stdout.slice(-500)}`);
    return { seconds: Number(times[1]) + Number(times[2]), output: stdout };
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** Pieces a second of ngspice: the long script less the short one, so that its start does not count. */
function spiceRate(netlist: Netlist, script: (pieces: number) => readonly string[], pieces: number): number {
  const times: number[] = [];
  for (let run = 0; run < RUNS; run += 1) {
    const long = spice(netlist, script(pieces)).seconds;
    const short = spice(netlist, script(Math.round(pieces / 10))).seconds;
    times.push(long - short);
  }
  return (0.9 * pieces) / median(times);
}

const alter = (values: Readonly<Record<string, number>>): string[] =>
  Object.entries(values).map(([name, value]) => `alter ${name} = ${value}`);

function compare(what: string, changes: Partial<DesignInput>): void {
  const design = aSet({ detector: { class: 'germanium', measured: true }, ...changes });
  const { plan } = prepared(parseDesign(design));
  const { circuit } = plan;
  const netlist = netlistOf(design, evaluate(design, { boxes: 0 }));
  const settled = alter(netlist.resistors(F, 1 / circuit.loadG, TUNED));
  const x = Float64Array.from(plan.nominal);
  const stray = plan.values.entries.findIndex(({ path }) => path === 'stray');
  const kept = x[stray] ?? 0;
  let sum = 0;
  const [changed = NaN] = rates(CHANGES, () => {
    for (let i = 0; i < CHANGES; i += 1) {
      x[stray] = kept + (i & 1023) * 1e-15;
      plan.fill(x);
      sum += voltagePerEmf(circuit, F, TUNED);
    }
  });
  plan.fill(plan.nominal);
  const [swept = NaN] = rates(POINTS, () => {
    const step = (3 * F - 0.3 * F) / (POINTS - 1);
    for (let i = 0; i < POINTS; i += 1) sum += voltagePerEmf(circuit, 0.3 * F + step * i, TUNED);
  });
  if (!Number.isFinite(sum)) throw new Error('The sweep gives no number.');

  const { output } = spice(netlist, [
    ...settled,
    `alter ctop = ${TUNED}`,
    `ac lin 1 ${F} ${F}`,
    `print vm(${netlist.detector})`,
  ]);
  const theirs = Number(/vm\(\w+\) = (\S+)/.exec(output)?.[1]);
  const apart = Math.abs(voltagePerEmf(circuit, F, TUNED) / theirs - 1);
  const changing = (count: number): string[] => [
    ...settled,
    `repeat ${Math.round(count / 2)}`,
    ...[1, 1.01].flatMap((by) => [`alter ctop = ${TUNED * by}`, `ac lin 1 ${F} ${F}`, 'destroy']),
    'end',
  ];
  if (!(apart < 1e-4)) throw new Error(`ngspice has other volts at the detector: ${theirs}.`);
  const spiceChanged = spiceRate(netlist, changing, CHANGES);
  const sweeping = (count: number): string[] => [...settled, `ac lin ${count} ${0.3 * F} ${3 * F}`];
  const spiceSwept = spiceRate(netlist, sweeping, POINTS);
  line(
    `${what}: changed designs`,
    thousands(changed),
    `ngspice ${thousands(spiceChanged)}, ratio ${(changed / spiceChanged).toFixed(0)}`,
  );
  line(
    `${what}: points of a sweep`,
    thousands(swept),
    `ngspice ${thousands(spiceSwept)}, ratio ${(swept / spiceSwept).toFixed(1)}`,
  );
  line(`${what}: detector volts apart`, apart.toExponential(1));
}

/** The network against ngspice in one process: a part altered and one point solved, and a plain sweep. */
export function networkBenchmarks(): void {
  heading('Network, a second');
  const { error } = spawnSync('ngspice', ['-v'], { encoding: 'utf8' });
  if (error !== undefined) {
    line('ngspice is not installed (Debian: apt-get install ngspice)', 'left out');
    return;
  }
  compare('one node', {});
  const taps = { aerial: 12, detector: 30 };
  compare('two taps', { coil: { ...aSolenoid, taps }, coupling: { kind: 'aerial-tap' }, detectorAt: 'tap' });
  compare('primary', { coupling: { kind: 'primary', l: 2e-5, r: 1, k: 0.3 } });
}
