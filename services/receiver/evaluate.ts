import type { Design, DesignInput } from './design';
import type { Figures, Sounding } from './figures';
import { findingsOf } from './findings/catalogue';
import { canonicalJson, sha256 } from './numeric/digest';
import { within } from './invalid-input';
import { parseDesign } from './parse';
import { rules as defaultRules, type Rules } from './rules';
import { remedyFor } from './seek/remedy';
import { survey } from './survey';
import type { Point, Verdict } from './verdict';
import { ENGINE_VERSION } from './version';

export interface EvaluateOptions {
  /** 0 to 2^32 - 1. */
  seed?: number | undefined;
  /** Boxes simulated; 0 gives a first verdict without them. */
  boxes?: number | undefined;
  rules?: Rules | undefined;
  onProgress?: ((done: number, total: number) => void) | undefined;
}

export const DEFAULT_SEED = 1;
export const DEFAULT_BOXES = 2000;

/**
 * Judges a design: reach, corners, share of boxes, points, detector, earphone and findings.
 * The same design, seed, boxes and rules give the same verdict to the last digit, in a browser and on a server.
 * @throws InvalidInput with every issue of the design
 */
export function evaluate(input: DesignInput | unknown, options: EvaluateOptions = {}): Verdict {
  const { seed = DEFAULT_SEED, boxes = DEFAULT_BOXES, rules = defaultRules, onProgress } = options;
  within('seed', seed, 0, 4294967295);
  within('boxes', boxes, 0, 200000);
  const design = parseDesign(input);
  const figures = survey(design, { seed, boxes, rules, onProgress, depth: 'verdict' });
  const context = { input, seed, boxes, tried: new Map() };
  const findings = findingsOf(figures, (found, stops) => remedyFor(found, figures, context, stops));
  const stops = findings.some((finding) => finding.severity === 'stop');
  const { audioFigures, detector, reach, margins, share, limits, coil } = figures;
  return {
    format: 'coilyard-verdict/1',
    engine: ENGINE_VERSION,
    rules: { version: rules.version, digest: sha256(canonicalJson(rules)) },
    seed,
    boxes,
    digest: sha256(canonicalJson(input)),
    outcome: stops ? 'stops' : 'clears',
    reach,
    margins,
    share,
    limits,
    coil: { ...coil, q: finite(coil.q) },
    points: figures.soundings.map((sounding) => pointOf(sounding, figures, design)),
    detector: { zeroBiasR: detector.zeroBiasR, vf1mA: detector.vf1mA, relative: finite(audioFigures.relative) },
    earphone: {
      outputR: finite(audioFigures.outputR),
      powerShare: finite(audioFigures.powerShare),
      voltageShare: finite(audioFigures.voltageShare),
      corner: finite(audioFigures.corner),
      level: finite(audioFigures.level),
    },
    findings,
  };
}

function finite(value: number | null): number | null {
  return value !== null && Number.isFinite(value) ? value : null;
}

function pointOf(sounding: Sounding, { plan }: Figures, design: Design): Point {
  const { f, c, position, q, qUnloaded, bandwidth, adjacent, sourceR, inputR, gain } = sounding;
  return {
    f,
    c,
    turns: design.tuning.kind === 'slider' && plan.mode !== 'inductance' ? position : null,
    q: finite(q),
    qUnloaded: finite(qUnloaded),
    bandwidth: finite(bandwidth),
    adjacent: finite(adjacent),
    sourceR: finite(sourceR),
    inputR: finite(inputR),
    gain: finite(gain),
  };
}
