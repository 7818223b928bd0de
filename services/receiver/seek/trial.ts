import { CATALOGUE } from '../findings/catalogue';
import type { Found } from '../findings/finding';
import { InvalidInput } from '../invalid-input';
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
  if (code === 'BAND-YIELD') return 'boxes';
  return code === 'BAND-CORNER' || code === 'BAND-AERIAL' || code === 'DATA-NONE' ? 'corners' : 'nominal';
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
    const figures = survey(design, { ...options, depth });
    return { reach: figures.reach.nominal, found: CATALOGUE.flatMap(([, look]) => look(figures)) };
  } catch (error) {
    if (error instanceof InvalidInput) return null;
    throw error;
  }
}
