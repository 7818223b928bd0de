import { PerformanceObserver } from 'node:perf_hooks';

/** Seconds of processor time that a piece of work takes: other work on the machine does not count. */
export function cpuSeconds(work: () => void): number {
  const begun = process.cpuUsage();
  work();
  const { user, system } = process.cpuUsage(begun);
  return (user + system) / 1e6;
}

export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length >> 1;
  const upper = sorted[middle] ?? NaN;
  return sorted.length % 2 === 1 ? upper : (upper + (sorted[middle - 1] ?? NaN)) / 2;
}

export function quantile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))] ?? NaN;
}

const RUNS = 7;

/** Median rates of works that are compared, in pieces a second, run in turn so that both meet the same machine. */
export function rates(pieces: number, ...works: readonly (() => void)[]): number[] {
  for (const work of works) work();
  const times = works.map((): number[] => []);
  for (let run = 0; run < RUNS; run += 1) works.forEach((work, i) => times[i]?.push(cpuSeconds(work)));
  return times.map((each) => pieces / median(each));
}

export interface Growth {
  /** Bytes that the heap grew by, a piece; collections in between hide some, so they are counted. */
  bytes: number;
  collections: number;
}

/** Heap growth of a warm loop. */
export async function heapGrowth(pieces: number, work: () => void): Promise<Growth> {
  let collections = 0;
  const observer = new PerformanceObserver((list) => (collections += list.getEntries().length));
  work();
  globalThis.gc?.();
  await new Promise((done) => setTimeout(done, 20));
  observer.observe({ entryTypes: ['gc'] });
  const before = process.memoryUsage().heapUsed;
  work();
  const after = process.memoryUsage().heapUsed;
  await new Promise((done) => setTimeout(done, 20));
  observer.disconnect();
  return { bytes: (after - before) / pieces, collections };
}

export function thousands(value: number): string {
  if (value >= 1e6) return `${(value / 1e6).toFixed(2)} M`;
  return value >= 1e3 ? `${(value / 1e3).toFixed(1)} k` : value.toFixed(0);
}

/** One line of the table: what, figure, and what it is measured against. */
export function line(what: string, figure: string, against = ''): void {
  process.stdout.write(`${what.padEnd(62)}${figure.padStart(22)}${against === '' ? '' : `   ${against}`}\n`);
}

export function heading(what: string): void {
  process.stdout.write(`\n${what}\n`);
}
