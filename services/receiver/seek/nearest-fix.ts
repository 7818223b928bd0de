import type { Ends } from '../coverage/reach';
import { CATALOGUE } from '../findings/catalogue';
import { parseDesign } from '../parse';
import { rules as defaultRules, type Rules } from '../rules';
import { survey } from '../survey';
import type { Change } from '../verdict';
import { knobsOf } from './knobs-of';
import { firstClearing, type RemedyContext } from './remedy';

export interface Fix {
  code: string;
  text: string;
  changes: Change[];
  /** Nominal reach with the changes made. */
  reach: Ends;
  /** Whether the changes bring a stop that was not there. */
  spoils: boolean;
}

export interface FixOptions {
  seed?: number | undefined;
  boxes?: number | undefined;
  rules?: Rules | undefined;
}

const TRIES = 60;

/**
 * Every kind of change that clears one of the findings asked for, the smallest step of each: turns, tap, coupling
 * capacitor, tuning element and so on. Those that bring no new stop come first.
 * @throws InvalidInput with every issue of the design
 */
export function nearestFix(
  input: unknown,
  codes: readonly string[],
  { seed = 1, boxes = 2000, rules = defaultRules }: FixOptions = {},
): Fix[] {
  const design = parseDesign(input);
  const figures = survey(design, { seed, boxes, rules, depth: codes.includes('BAND-YIELD') ? 'verdict' : 'corners' });
  const all = CATALOGUE.flatMap(([, look]) => look(figures));
  const before = new Set(all.filter((found) => found.severity === 'stop').map((found) => found.code));
  const fixes: Fix[] = [];
  const context: RemedyContext = { input, seed, boxes, tried: new Map() };
  for (const found of all) {
    if (!codes.includes(found.code)) continue;
    for (const knob of knobsOf(found, figures, input)) {
      const budget = { left: found.code === 'BAND-YIELD' ? 8 : TRIES };
      const cleared = firstClearing(knob, { found, rules, context, before }, budget);
      if (cleared === null) continue;
      const { step, spoils, outcome } = cleared;
      fixes.push({ code: found.code, text: step.text, changes: step.changes, reach: outcome.reach, spoils });
    }
  }
  return fixes.sort((a, b) => Number(a.spoils) - Number(b.spoils));
}
