import { InvalidInput, contour, evaluate, nearestFix, responseCurves } from '@/services/receiver';
import type { DesignInput, Verdict } from '@/services/receiver';
import { type Finding, allFindings, designOf, stopsIn, versionChange, withChange } from '@/services/kits/rules';
import type { VersionContent } from '@/services/kits/schemas';
import type { ResponseSetting } from '@/components/charts/response-shape';
import type { LiveVerdict, TriedRemedy, VerdictAnswer, VerdictRequest } from './verdict-messages';

/** The server judges with this seed too. */
const SEED = 1;
const CONTOUR_BOXES = 500;
const CURVE_POINTS = 141;
/** Closer points around each peak, so that it is drawn as sharp as it is. */
const PEAK_STEPS = 12;
const PEAK_STEP = 0.0015;
const MOST_REMEDIES = 3;
/** Boxes a way to mend is judged by: enough to show 99 %, few enough to be quick. */
const FIX_BOXES = 1_000;

/** Works out one request. The same functions run on the server when a version is sent to check. */
export function answerTo({ number, content, boxes }: VerdictRequest): VerdictAnswer {
  const { design, lacks } = designOf(content);
  if (!design) return { number, boxes, kind: 'lacks', lacks };
  try {
    return { number, boxes, kind: 'verdict', live: liveVerdict(design, content, boxes) };
  } catch (error) {
    if (!(error instanceof InvalidInput)) throw error;
    return { number, boxes, kind: 'invalid', issues: error.issues.map(({ path, message }) => ({ path, message })) };
  }
}

function liveVerdict(design: DesignInput, content: VersionContent, boxes: number): LiveVerdict {
  const verdict = evaluate(design, { boxes, seed: SEED });
  const findings = allFindings(verdict, content);
  return {
    verdict,
    findings,
    contour: boxes === 0 ? null : contour(design, { seed: SEED, boxes: CONTOUR_BOXES }),
    settings: settingsOf(design, verdict),
    remedies: boxes === 0 ? null : triedRemedies(design, content, findings),
  };
}

/** Response at the dial positions of the three points, over the rail's whole axis and a little more. */
function settingsOf(design: DesignInput, verdict: Verdict): ResponseSetting[] {
  const tuned = verdict.points.map((point) => point.f);
  const low = design.band.lo / 1.3;
  const ratio = (design.band.hi * 1.3) / low;
  const f = Array.from({ length: CURVE_POINTS }, (_, index) => low * ratio ** (index / (CURVE_POINTS - 1)));
  for (const at of tuned) for (let step = -PEAK_STEPS; step <= PEAK_STEPS; step++) f.push(at * (1 + step * PEAK_STEP));
  f.sort((a, b) => a - b);
  return responseCurves(design, tuned, f).map((curve, index) => ({
    f: tuned[index] ?? 0,
    width: verdict.points[index]?.bandwidth ?? null,
    curve: { f, db: [...curve] },
  }));
}

interface Proposal {
  code: string;
  text: string;
  changes: readonly { path: string; from: unknown; to: unknown }[];
}

/** Ways to mend what stops it that a press can apply, each judged under the same tolerances; those that clear it first. */
function triedRemedies(design: DesignInput, content: VersionContent, findings: readonly Finding[]): TriedRemedy[] {
  const stops = stopsIn(findings);
  const proposals: Proposal[] = [
    ...nearestFix(
      design,
      stops.map(({ code }) => code),
      { seed: SEED, boxes: FIX_BOXES },
    ),
    ...stops.flatMap(({ code, remedy }) => (remedy ? [{ code, text: remedy.text, changes: remedy.changes }] : [])),
  ];
  const tried: TriedRemedy[] = [];
  for (const proposal of proposals) {
    if (tried.some(({ text }) => text === proposal.text)) continue;
    const remedy = judged(content, proposal);
    if (remedy) tried.push(remedy);
  }
  return tried.sort((a, b) => Number(a.stops.length > 0) - Number(b.stops.length > 0)).slice(0, MOST_REMEDIES);
}

function judged(content: VersionContent, { code, text, changes }: Proposal): TriedRemedy | null {
  const change = versionChange(content, changes);
  if (!change) return null;
  const next = withChange(content, change);
  const { design } = designOf(next);
  const verdict = design && evaluateOrNull(design);
  if (!verdict) return null;
  const isQuantity = change.quantities.size > 0;
  // What the rest of the version lacks, such as its guide, is no matter of this remedy.
  const left = isQuantity ? allFindings(verdict, next).filter((stop) => stop.code === code) : verdict.findings;
  return {
    text,
    code,
    change,
    reach: isQuantity ? null : verdict.reach,
    stops: stopsIn(left).map(({ message }) => message),
  };
}

function evaluateOrNull(design: DesignInput): Verdict | null {
  try {
    return evaluate(design, { boxes: FIX_BOXES, seed: SEED });
  } catch (error) {
    if (error instanceof InvalidInput) return null;
    throw error;
  }
}
