import { Design, type DesignInput, type Verdict } from '@/services/receiver';

/**
 * A design as a netlist, written from the description of the receiver's network and not from the engine's: each coil
 * section an inductor with its resistor, couplings as K, a wire aerial as an open lossless line. Frequency enters only
 * the resistors, which `resistors` gives for one frequency.
 */
export interface Netlist {
  design: Design;
  /** Elements, with the tuning capacitance `ctop` alone across the top. */
  text: string;
  /** The same with gang, padder and trimmer as parts: `cgang` is the gang. */
  partsText: string;
  detector: string;
  /** Values of all resistors that depend on frequency or load. */
  resistors(f: number, load: number, tuning: number): Record<string, number>;
  /** Effective height in metre: volts of EMF for a field of 1 V/m. */
  height(f: number): number;
  gang: { min: number; max: number };
  /** Frequency up to which the reach is looked for: three times the band's upper edge, or where the line form of a wire ends. */
  until: number;
  /** Ends of the capacitance across the top, padder and trimmer included. */
  across: { min: number; max: number };
}

const C = 299792458;
const E0 = 8.8541878128e-12;

function exact(value: unknown): number {
  if (typeof value !== 'number') throw new TypeError('These circuits have exact values only.');
  return value;
}

const asinh = Math.asinh;
const parallel = (l: number, x: number): number => asinh(l / x) - Math.sqrt(1 + (x / l) ** 2) + x / l;
const collinear = (l: number): number => 2 * l * Math.log(2 * l) - 2 * l * Math.log(l);
const corner = (l: number, u: number): number => l * asinh(u / l) + u * asinh(l / u);

/** Capacitance of an aerial wire by average potentials, riser and top each with its own charge. */
function wireCapacitance(h: number, l: number, a: number): number {
  const n11 = 2 * h * parallel(h, a) - collinear(h);
  if (l === 0) return (4 * Math.PI * E0 * h * h) / n11;
  const n22 = 2 * l * (parallel(l, a) - parallel(l, 2 * h));
  const n12 = 2 * corner(l, h) - corner(l, 2 * h);
  const [p, q, m] = [n11 / (h * h), n22 / (l * l), n12 / (h * l)];
  return (4 * Math.PI * E0 * (p + q - 2 * m)) / (p * q - m * m);
}

interface Feed {
  lines: string[];
  height(f: number): number;
  radiation(f: number): number;
  /** Highest frequency of the line form: 2.2 radians of wire. */
  until: number;
}

/** The aerial from its EMF to node `feed`, without resistances. */
function aerialLines({ aerial }: Design): Feed {
  if (aerial.kind === 'circuit') {
    const height = exact(aerial.effectiveHeight);
    const lines = [`laer emf a1 ${exact(aerial.l)}`, `caer a1 feed ${exact(aerial.c)}`];
    return { lines, height: () => height, radiation: () => 0, until: Infinity };
  }
  const h = exact(aerial.vertical);
  const l = aerial.horizontal === 0 ? 0 : exact(aerial.horizontal);
  const c = exact(aerial.siteFactor) * wireCapacitance(h, l, exact(aerial.radius));
  const height = (f: number): number => {
    const k = (2 * Math.PI * f) / C;
    return (Math.cos(k * l) - Math.cos(k * (h + l))) / (k * Math.sin(k * (h + l)));
  };
  // Looking into an open line is -j Z0 / tan(wS/c); the EMF stands in series with it.
  const lines = [`taer feed emf far emf z0=${(h + l) / (C * c)} td=${(h + l) / C}`, 'ropen far emf 1e13'];
  return {
    lines,
    height,
    radiation: (f) => 40 * (((2 * Math.PI * f) / C) * height(f)) ** 2,
    until: (2.2 * C) / (2 * Math.PI * (h + l)),
  };
}

interface Sections {
  m: number[][];
  share: number[];
  /** Node above each section. */
  nodes: string[];
  aerialNode: string;
  detectorNode: string;
}

function sectionsOf(design: Design, verdict: Verdict): Sections {
  const { coil, coupling, detectorAt } = design;
  const m = verdict.coil.sections.map((row) => [...row]);
  const nodes = m.map((_, i) => (i === m.length - 1 ? 'top' : `tap${i + 1}`));
  const taps = coil.taps;
  const order = [...new Set([taps?.aerial, taps?.detector].filter((tap) => tap !== undefined))].sort((a, b) => a - b);
  const nodeOf = (tap: number | undefined): string =>
    tap === undefined ? 'top' : (nodes[order.indexOf(tap)] ?? 'top');
  let share: number[];
  if (coil.kind === 'solenoid') {
    const ends = [0, ...order, coil.turns];
    share = m.map((_, i) => ((ends[i + 1] ?? 0) - (ends[i] ?? 0)) / coil.turns);
  } else {
    const selves = m.reduce((sum, row, i) => sum + (row[i] ?? 0), 0);
    share = m.map((row, i) => (row[i] ?? 0) / selves);
    // A measured coil's matrix is the design's own.
    if (coil.kind === 'measured' && coil.sections !== undefined)
      coil.sections.forEach((row, i) => row.forEach((l, j) => ((m[i] ?? [])[j] = exact(l))));
  }
  return {
    m,
    share,
    nodes,
    aerialNode: coupling.kind === 'aerial-tap' ? nodeOf(taps?.aerial) : 'top',
    detectorNode: detectorAt === 'tap' ? nodeOf(taps?.detector) : 'top',
  };
}

/** Gang's ends; a foil's from its own plates. */
function gangOf({ tuning }: Design): { min: number; max: number; tan: number } {
  if (tuning.kind === 'capacitor') return { min: exact(tuning.min), max: exact(tuning.max), tan: 0 };
  if (tuning.kind !== 'foil') throw new TypeError('These circuits are tuned by a capacitor.');
  let radius = tuning.form === 'sleeve' ? exact(tuning.innerRadius) : 0;
  let gap = 0;
  for (const [t, e] of tuning.layers) {
    gap += (tuning.form === 'sleeve' ? Math.log((radius + exact(t)) / radius) : exact(t)) / exact(e);
    radius += exact(t);
  }
  const travel = exact(tuning.travel);
  const area = tuning.form === 'sleeve' ? 2 * Math.PI * travel : tuning.faces * exact(tuning.width) * travel;
  const min = exact(tuning.min);
  return { min, max: min + (E0 * area) / gap, tan: exact(tuning.tan ?? 0) };
}

const CLASS_CJ: Record<string, number> = {
  germanium: 0.8e-12,
  'zero-bias-schottky': 0.18e-12,
  schottky: 0.7e-12,
  silicon: 4e-12,
  mineral: 3e-12,
  'oxide-contact': 15e-12,
};

export function netlistOf(input: DesignInput, verdict: Verdict): Netlist {
  const design = Design.parse(input);
  const { coupling, earth, coil } = design;
  const feed = aerialLines(design);
  const { m, share, nodes, aerialNode, detectorNode } = sectionsOf(design, verdict);
  const whole = m.flat().reduce((sum, l) => sum + l, 0);
  const lines = ['vemf emf 0 dc 0 ac 1', 'itop 0 top dc 0 ac 0', ...feed.lines, 'rser feed e1 1'];
  lines.push(earth.kind === 'none' ? 'cearth e1 e2 30e-12' : 'vearth e1 e2 0');
  const entry = coupling.kind === 'primary' ? 'prim' : aerialNode;
  lines.push(coupling.kind === 'series-c' ? `ccoup e2 ${entry} ${exact(coupling.c)}` : `vcoup e2 ${entry} 0`);
  m.forEach((row, i) => {
    const below = i === 0 ? '0' : (nodes[i - 1] ?? '0');
    lines.push(`l${i + 1} ${nodes[i]} s${i + 1} ${row[i]}`, `rs${i + 1} s${i + 1} ${below} 1`);
    for (let j = 0; j < i; j += 1) {
      const k = (row[j] ?? 0) / Math.sqrt((row[i] ?? 0) * (m[j]?.[j] ?? 0));
      lines.push(`k${j + 1}${i + 1} l${j + 1} l${i + 1} ${k}`);
    }
  });
  if (coupling.kind === 'primary') {
    const lp = exact(coupling.l);
    lines.push(`lp prim pr ${lp}`, `rp pr 0 ${exact(coupling.r)}`);
    m.forEach((row, i) => {
      // M towards a section in proportion to what links it.
      const linked = row.reduce((sum, l) => sum + l, 0);
      const mutual = (exact(coupling.k) * Math.sqrt(lp * whole) * linked) / whole;
      lines.push(`kp${i + 1} lp l${i + 1} ${mutual / Math.sqrt(lp * (row[i] ?? 0))}`);
    });
  }
  const gang = gangOf(design);
  const trimmer = exact(design.trimmer ?? 0);
  const padder = exact(design.padder ?? 0);
  const cSelf = coil.kind === 'measured' ? exact(coil.cSelf ?? 0) : verdict.coil.cSelf;
  lines.push(`cown top 0 ${cSelf + exact(design.stray)}`);
  lines.push(`cjunction ${detectorNode} 0 ${CLASS_CJ[design.detector.class ?? '']}`, `rload ${detectorNode} 0 1e5`);
  const across = (c: number): number =>
    padder === 0 ? c + trimmer : (padder * (c + trimmer)) / (padder + c + trimmer);
  const parts = padder === 0 ? ['vpad top gang 0'] : [`cpad top gang ${padder}`];
  parts.push(`cgang gang 0 ${gang.max}`);
  if (trimmer > 0) parts.push(`ctrim gang 0 ${trimmer}`);
  const deck = (more: readonly string[]): string =>
    ['* receiver', '.options rshunt=1e13', ...lines, ...more, '.end', ''].join('\n');
  return {
    design,
    text: deck(['ctop top 0 1e-12', 'rfoil top 0 1e13']),
    partsText: deck([...parts, 'rfoil top 0 1e13']),
    detector: detectorNode,
    height: feed.height,
    until: Math.min(3 * design.band.hi, feed.until),
    gang,
    across: { min: across(gang.min), max: across(gang.max) },
    resistors(f, load, tuning) {
      const w = 2 * Math.PI * f;
      const loss = coil.q !== undefined ? (w * whole) / exact(coil.q) : coil.kind === 'measured' ? exact(coil.r) : NaN;
      const aerialR = design.aerial.kind === 'circuit' ? exact(design.aerial.r) : feed.radiation(f);
      const values: Record<string, number> = {
        rser: aerialR + (earth.kind === 'none' ? 100 : exact(earth.r)),
        rload: load,
        rfoil: gang.tan > 0 && tuning > 0 ? 1 / (w * tuning * gang.tan) : 1e13,
      };
      share.forEach((part, i) => (values[`rs${i + 1}`] = loss * part));
      return values;
    },
  };
}
