import type { Verdict } from '@/services/receiver';
import type { Netlist } from './netlist';
import { runOn } from './programs';

/** What ngspice makes of one receiver. */
export interface SpiceAnswer {
  /** Detector volts per V/m at each point of the verdict, and one step below and above it. */
  points: { own: number; below: number; above: number }[];
  /** Frequencies of a sweep and the capacitance that tunes the top to each. */
  sweep: { f: number; needed: number }[];
  /** Frequency near each end of the reach at which the tuned circuit's susceptance crosses zero; NaN where none does. */
  lo: number;
  hi: number;
}

export interface SpiceCase {
  netlist: Netlist;
  verdict: Verdict;
}

/** Steps a decade of the sweep, and width and steps of the search near an end. */
const DECADE = 400;
const NEAR = 2e-3;
const FINE = 41;

function altered(values: Readonly<Record<string, number>>): string[] {
  return Object.entries(values).map(([name, value]) => `alter ${name} = ${value}`);
}

function commands({ netlist, verdict }: SpiceCase, index: number): string[] {
  const { design } = netlist;
  const { step } = design.band;
  const lines = [`source points-${index}.cir`];
  verdict.points.forEach(({ f, c, inputR }, point) => {
    lines.push(`alter ctop = ${c}`);
    [f, f - step, f + step].forEach((at, side) => {
      lines.push(...altered(netlist.resistors(at, inputR ?? NaN, c)), `ac lin 1 ${at} ${at}`);
      lines.push(`echo ${index} ${point} ${side}`, `print vm(${netlist.detector})`);
    });
  });
  const middle = verdict.points[1];
  const load = middle?.inputR ?? NaN;
  const open = altered(netlist.resistors(middle?.f ?? NaN, load, 0));
  const probe = ['alter @vemf[acmag] = 0', 'alter @itop[acmag] = 1'];
  lines.push(...open, ...probe, 'alter ctop = 1e-21');
  lines.push(`ac dec ${DECADE} ${0.3 * design.band.lo} ${netlist.until}`, `wrdata sweep-${index}.txt v(top)`);
  lines.push('remcirc', `source parts-${index}.cir`, ...probe);
  for (const [end, gang] of [
    ['lo', netlist.gang.max],
    ['hi', netlist.gang.min],
  ] as const) {
    const f = verdict.reach.nominal[end];
    lines.push(`alter cgang = ${gang}`, ...altered(netlist.resistors(f, load, 0)));
    lines.push(`ac lin ${FINE} ${f * (1 - NEAR)} ${f * (1 + NEAR)}`, `wrdata ${end}-${index}.txt v(top)`);
  }
  lines.push('remcirc');
  return lines;
}

/** Susceptance at the top for each row of frequency, real and imaginary part of the voltage of 1 A. */
function susceptances(text: string): { f: number; b: number }[] {
  return text
    .trim()
    .split('\n')
    .map((line) => {
      const [f = NaN, re = NaN, im = NaN] = line.trim().split(/\s+/).map(Number);
      return { f, b: -im / (re * re + im * im) };
    });
}

/** First rise of the susceptance through zero, between two points by a straight line. */
function crossing(rows: readonly { f: number; b: number }[]): number {
  for (let i = 1; i < rows.length; i += 1) {
    const [p, q] = [rows[i - 1], rows[i]];
    if (p !== undefined && q !== undefined && p.b < 0 && q.b >= 0) return p.f + ((q.f - p.f) * p.b) / (p.b - q.b);
  }
  return NaN;
}

/** Runs all receivers in one process. */
export function spiceAnswers(cases: readonly SpiceCase[]): SpiceAnswer[] {
  const files: Record<string, string> = {};
  cases.forEach(({ netlist }, index) => {
    files[`points-${index}.cir`] = netlist.text;
    files[`parts-${index}.cir`] = netlist.partsText;
  });
  const script = ['set numdgt=13', ...cases.flatMap(commands), 'quit'];
  files['all.cir'] = ['* receivers', '.control', ...script, '.endc', '.end', ''].join('\n');
  return runOn('ngspice', ['-b', 'all.cir'], files, ({ output, file }) => {
    const volts = new Map<string, number>();
    for (const [, key = '', value] of output.matchAll(/^(\d+ \d \d)\s+vm\(\w+\) = (\S+)/gm))
      volts.set(key, Number(value));
    return cases.map(({ netlist, verdict }, index) => {
      const { step } = netlist.design.band;
      const at = (point: number, side: number, f: number): number =>
        (volts.get(`${index} ${point} ${side}`) ?? NaN) * Math.abs(netlist.height(f));
      return {
        points: verdict.points.map(({ f }, point) => ({
          own: at(point, 0, f),
          below: at(point, 1, f - step),
          above: at(point, 2, f + step),
        })),
        sweep: susceptances(file(`sweep-${index}.txt`)).map(({ f, b }) => ({ f, needed: -b / (2 * Math.PI * f) })),
        lo: crossing(susceptances(file(`lo-${index}.txt`))),
        hi: crossing(susceptances(file(`hi-${index}.txt`))),
      };
    });
  });
}
