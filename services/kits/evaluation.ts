import { InvalidInput, contour, evaluate, type Verdict } from '../receiver';
import { invalid, refused } from '../problem';
import { type Finding, allFindings, designOf, fieldOf, stopsIn } from './rules';
import type { VersionContent } from './schemas';

export interface EvaluationOptions {
  boxes: number;
  seed: number;
  /** Works out the chance contour of the rail too, with fewer boxes. */
  withContour?: boolean;
}

export interface Evaluation {
  verdict: Verdict;
  /** The engine's findings and the version's own, stops first. */
  findings: Finding[];
  outcome: 'clears' | 'stops';
  contour: { f: number[]; share: number[] } | null;
}

/** Boxes behind the contour: it is drawn, not judged by. */
const CONTOUR_BOXES = 1000;

/** Evaluates a version's content here and now. Refused while something is not chosen; invalid where a value cannot be. */
export function evaluateContent(
  content: VersionContent,
  { boxes, seed, withContour = false }: EvaluationOptions,
): Evaluation {
  const { design, lacks } = designOf(content);
  if (!design) throw refused(lacks.join(' '));
  try {
    const verdict = evaluate(design, { boxes, seed });
    const findings = allFindings(verdict, content);
    const outcome = stopsIn(findings).length > 0 ? 'stops' : 'clears';
    return {
      verdict,
      findings,
      outcome,
      contour: withContour ? contour(design, { boxes: CONTOUR_BOXES, seed }) : null,
    };
  } catch (error) {
    if (!(error instanceof InvalidInput)) throw error;
    throw invalid(
      `This cannot be evaluated: ${error.issues.map(({ path, message }) => `${pathWords(path)}: ${message}`).join(' ')}`,
      Object.fromEntries(error.issues.map(({ path, message }) => [path, message])),
    );
  }
}

function pathWords(path: string): string {
  const field = fieldOf(path);
  switch (field.kind) {
    case 'line':
      return `line ${field.reference}`;
    case 'place':
      return field.place;
    case 'circuit':
      return field.setting;
    default:
      return path;
  }
}
