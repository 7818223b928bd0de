import { nominalMargins } from '../survey';
import type { Figures } from '../figures';
import type { Found } from '../findings/finding';
import { parseDesign } from '../parse';
import { InvalidInput } from '../invalid-input';
import type { Rules } from '../rules';
import type { Change, Finding } from '../verdict';
import { applyChanges } from './changes';
import type { Knob, Step } from './knobs';
import { knobsOf } from './knobs-of';
import { attempt, depthOf, type Outcome } from './trial';

export interface RemedyContext {
  /** The design as it was given: changes speak of its keys. */
  input: unknown;
  seed: number;
  boxes: number;
  /** Outcomes of changes already tried, by depth and changes: several findings try the same ones. */
  tried: Map<string, Outcome | null>;
}

/** Most judgements of one finding, and of one that needs the boxes drawn each time. */
const MOST_TRIES = 40;
const MOST_DRAWN = 20;
/** Most judgements that need every corner. */
const MOST_CORNERS = 12;

/** Stops that a change brings about. */
function newStops(after: Outcome, before: ReadonlySet<string>): boolean {
  return after.found.some((found) => found.severity === 'stop' && !before.has(found.code));
}

/** An end of the band is told from the nominal reach alone, in a fraction of the time. */
function endCleared(code: string, input: unknown, changes: readonly Change[], rules: Rules): boolean {
  try {
    const margins = nominalMargins(parseDesign(applyChanges(input, changes)));
    return (code === 'BAND-LOW' ? margins.lo : margins.hi) >= rules.guardNominal;
  } catch (error) {
    if (error instanceof InvalidInput) return false;
    throw error;
  }
}

export interface Search {
  found: Pick<Found, 'code' | 'path' | 'message'>;
  rules: Rules;
  context: RemedyContext;
  before: ReadonlySet<string>;
}

/** Steps looked at beyond the first that clears but brings a new stop. */
const BEYOND = 6;

export interface Cleared {
  step: Step;
  outcome: Outcome;
  /** Whether it stops the design for another reason. */
  spoils: boolean;
}

/** First step of a knob that clears the finding without a new stop, or else the first that clears it at all. */
export function firstClearing(knob: Knob, search: Search, budget: { left: number }): Cleared | null {
  const { code, path } = search.found;
  if (code === 'BAND-LOW' || code === 'BAND-HIGH') return endClearing([...knob], search);
  let spoiling: Cleared | null = null;
  let beyond = 0;
  for (const step of knob) {
    if (budget.left <= 0 || beyond > BEYOND) break;
    budget.left -= 1;
    if (spoiling !== null) beyond += 1;
    const outcome = tried(step, search);
    if (outcome === null) continue;
    if (outcome.found.some((after) => after.code === code && (after.path === path || !REPEATED.has(code)))) continue;
    const cleared = { step, outcome, spoils: newStops(outcome, search.before) };
    if (!cleared.spoils) return cleared;
    spoiling ??= cleared;
  }
  return spoiling;
}

function tried({ changes }: Step, { found, rules, context }: Search): Outcome | null {
  const depth = depthOf(found.code);
  const key = `${depth} ${JSON.stringify(changes)}`;
  const known = context.tried.get(key);
  if (known !== undefined) return known;
  const outcome = attempt(context.input, changes, { rules, seed: context.seed, boxes: context.boxes }, depth);
  context.tried.set(key, outcome);
  return outcome;
}

/** An end moves one way with each knob, so the smallest step that clears it is found by doubling and halving. */
function endClearing(steps: readonly Step[], search: Search): Cleared | null {
  const { found, rules, context, before } = search;
  const clears = (index: number): boolean => endCleared(found.code, context.input, steps[index]?.changes ?? [], rules);
  let low = -1;
  let high = 0;
  while (high < steps.length && !clears(high)) {
    low = high;
    high = 2 * high + 1;
  }
  if (high >= steps.length) {
    high = steps.length - 1;
    if (high <= low || !clears(high)) return null;
  }
  while (high - low > 1) {
    const middle = Math.floor((low + high) / 2);
    if (clears(middle)) high = middle;
    else low = middle;
  }
  const step = steps[high];
  const outcome = step === undefined ? null : tried(step, search);
  if (step === undefined || outcome === null || outcome.found.some((after) => after.code === found.code)) return null;
  return { step, outcome, spoils: newStops(outcome, before) };
}

/** Codes that may stand several times, told apart by their path. */
const REPEATED: ReadonlySet<string> = new Set(['SEL-STRONG', 'DATA-NONE', 'LOT-SMALL', 'UNIT-ODD']);

/**
 * The nearest change that clears a finding: the usual remedy first, one that brings no new stop before one that does.
 * Null where no change of the file alone clears it.
 */
export function remedyFor(
  found: Found,
  figures: Figures,
  context: RemedyContext,
  before: ReadonlySet<string>,
): Finding['remedy'] {
  const depth = depthOf(found.code);
  const most = depth === 'share' ? MOST_DRAWN : depth === 'nominal' ? MOST_TRIES : MOST_CORNERS;
  const budget = { left: most };
  const search: Search = { found, rules: figures.rules, context, before };
  let fallback: Finding['remedy'] = null;
  for (const knob of knobsOf(found, figures, context.input)) {
    const cleared = firstClearing(knob, search, budget);
    if (cleared === null) continue;
    if (!cleared.spoils) return cleared.step;
    // A note is no reason for a stop; a stop may have to go one after the other.
    if (found.severity === 'stop') fallback ??= cleared.step;
  }
  return fallback;
}
