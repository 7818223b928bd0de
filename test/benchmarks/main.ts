import { boxBenchmarks } from './boxes';
import { networkBenchmarks } from './network';
import { seekBenchmarks } from './seek';
import { startBenchmarks, verdictBenchmarks } from './verdicts';

// Printed, not asserted: one run, medians, ratios of what ran in turn on the same machine.
const parts = {
  boxes: boxBenchmarks,
  network: networkBenchmarks,
  verdicts: verdictBenchmarks,
  seek: seekBenchmarks,
  start: startBenchmarks,
};
const asked = process.argv.slice(2);
for (const [name, run] of Object.entries(parts)) if (asked.length === 0 || asked.includes(name)) await run();
