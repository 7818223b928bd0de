import { InvalidInput, contour, evaluate, responseCurves } from '@/services/receiver';
import type { DesignInput, Verdict } from '@/services/receiver';
import { type Finding, allFindings, designOf, settingsFrom, stopsIn } from '@/services/kits/rules';
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
    remedies: triedRemedies(content, findings),
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

/** Each remedy that a press can apply, with what the version comes to under the same tolerances. */
function triedRemedies(content: VersionContent, findings: readonly Finding[]): TriedRemedy[] {
  const tried: TriedRemedy[] = [];
  const stoodBefore = new Set(stopsIn(findings).map(({ code }) => code));
  for (const { code, remedy } of findings) {
    if (!remedy || tried.length === MOST_REMEDIES || tried.some(({ text }) => text === remedy.text)) continue;
    const changed = settingsFrom(content, remedy.changes);
    if (!changed) continue;
    const next = withSettings(content, changed);
    const { design } = designOf(next);
    if (!design) continue;
    const verdict = evaluateOrNull(design);
    if (!verdict) continue;
    const left = stopsIn(allFindings(verdict, next)).filter(
      (stop) => stop.code === code || !stoodBefore.has(stop.code),
    );
    tried.push({
      text: remedy.text,
      code,
      reach: changed.circuit === content.circuit ? null : verdict.reach,
      stops: left.map(({ message }) => message),
    });
  }
  return tried;
}

export function withSettings(
  content: VersionContent,
  { circuit, quantities }: { circuit: VersionContent['circuit']; quantities: ReadonlyMap<string, number> },
): VersionContent {
  return {
    ...content,
    circuit,
    lines: content.lines.map((line) => ({ ...line, quantity: quantities.get(line.reference) ?? line.quantity })),
  };
}

function evaluateOrNull(design: DesignInput): Verdict | null {
  try {
    return evaluate(design, { boxes: 0, seed: SEED });
  } catch (error) {
    if (error instanceof InvalidInput) return null;
    throw error;
  }
}
