import { CATALOGUE } from '../findings/catalogue';
import type { Found } from '../findings/finding';
import { InvalidInput } from '../invalid-input';
import { clopperPearson } from '../numeric/quantiles';
import { parseDesign } from '../parse';
import { survey, type SurveyDepth } from '../survey';
import type { Ends } from '../coverage/reach';
import type { Rules } from '../rules';
import type { Change } from '../verdict';
import { applyChanges } from './changes';

export interface TrialOptions {
  rules: Rules;
  seed: number;
  boxes: number;
}

export interface Outcome {
  reach: Ends;
  found: Found[];
}

/** How far a design has to be worked out before a finding of this code can be told. */
export function depthOf(code: string): SurveyDepth {
  if (code === 'BAND-YIELD') return 'share';
  if (code === 'BAND-CORNER') return 'worst';
  if (code === 'BAND-AERIAL') return 'aerials';
  return code === 'DATA-NONE' ? 'corners' : 'nominal';
}

/** Most boxes that may miss before the sure share is below what is asked. */
export function mostMissed(boxes: number, rules: Rules): number {
  let low = -1;
  let high = boxes;
  while (high - low > 1) {
    const missed = Math.floor((low + high) / 2);
    if (clopperPearson(boxes - missed, boxes, rules.yieldConfidence).low >= rules.yieldTarget) low = missed;
    else high = missed;
  }
  return low;
}

/** Judges a design with changes made, no deeper than asked; null where the changed file is not valid. */
export function attempt(
  input: unknown,
  changes: readonly Change[],
  options: TrialOptions,
  depth: SurveyDepth,
): Outcome | null {
  try {
    const design = parseDesign(applyChanges(input, changes));
    const missed = depth === 'share' ? mostMissed(options.boxes, options.rules) : undefined;
    const figures = survey(design, { ...options, depth, mostMissed: missed });
    return { reach: figures.reach.nominal, found: CATALOGUE.flatMap(([, look]) => look(figures)) };
  } catch (error) {
    if (error instanceof InvalidInput) return null;
    throw error;
  }
}
