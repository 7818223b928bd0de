import type { Skin, Winding } from '../coils/loss';
import type { Farad, Henry, Metre, Ohm } from '../units';

/**
 * The receiver's network as numbers: one record, filled again for each corner or box, with its own scratch, so that the
 * inner loops allocate nothing. Nodes: the upper end of each coil section in turn, then the primary's free end.
 */
export interface Circuit {
  wire: boolean;
  aerialR: Ohm;
  aerialL: Henry;
  /** Capacitance of the aerial; for a wire after its site factor. */
  aerialC: Farad;
  /** 1, or what a longer or shorter wire at the buyer's multiplies the aerial's capacitance by. */
  aerialScale: number;
  height: Metre;
  vertical: Metre;
  horizontal: Metre;
  earthR: Ohm;
  /** Series capacitance of a counterpoise; 0 for an earth. */
  earthC: Farad;
  /** Series coupling capacitor; 0 for none. */
  couplingC: Farad;
  aerialNode: number;
  detectorNode: number;
  sections: number;
  /** Self and mutual inductances of the sections, 3 x 3, row by row. */
  m: Float64Array;
  /** Each section's share of the coil's resistance. */
  share: Float64Array;
  /** Inductance of the whole coil. */
  l: Henry;
  loss: 'q' | 'r' | 'model';
  q: number;
  r: Ohm;
  winding: Winding;
  /** Core loss as a loss tangent. */
  coreTan: number;
  primary: boolean;
  primaryL: Henry;
  primaryR: Ohm;
  primaryK: number;
  primaryWinding: Winding | null;
  cSelf: Farad;
  stray: Farad;
  cj: Farad;
  /** Conductance of the detector. */
  loadG: number;
  /** Ends of the tuning capacitance the circuit sees, padder and trimmer included. */
  cMin: Farad;
  cMax: Farad;
  /** Loss tangent of a foil capacitor. */
  foilTan: number;
  /** Ends of the position of a slider (turns) or a variable inductance (henry). */
  positionMin: number;
  positionMax: number;
  /** While boxes are drawn, coils that are sums over loops follow their sensitivities instead. */
  drawing: boolean;
  /** False where a draw makes a coil that cannot be. */
  sound: boolean;
  skin: Skin;
  zr: Float64Array;
  zi: Float64Array;
  yr: Float64Array;
  yi: Float64Array;
  order: Int32Array;
  /** Last result of `aerialAdmittance`. */
  aerialYr: number;
  aerialYi: number;
  /** Last result of `topAdmittance`. */
  topRe: number;
  topIm: number;
}

export function emptyCircuit(): Circuit {
  return {
    wire: false,
    aerialR: 0,
    aerialL: 0,
    aerialC: 0,
    aerialScale: 1,
    height: 0,
    vertical: 0,
    horizontal: 0,
    earthR: 0,
    earthC: 0,
    couplingC: 0,
    aerialNode: 0,
    detectorNode: 0,
    sections: 1,
    m: new Float64Array(9),
    share: new Float64Array(3),
    l: 0,
    loss: 'q',
    q: 100,
    r: 0,
    winding: { wire: 0, bare: 0, strands: 1, bundle: 0, phi: 1, resistivity: 0, lay: 1 },
    coreTan: 0,
    primary: false,
    primaryL: 0,
    primaryR: 0,
    primaryK: 0,
    primaryWinding: null,
    cSelf: 0,
    stray: 0,
    cj: 0,
    loadG: 0,
    cMin: 0,
    cMax: 0,
    foilTan: 0,
    positionMin: 0,
    positionMax: 0,
    drawing: false,
    sound: true,
    skin: { delta: 0, f: 0, x: 0 },
    zr: new Float64Array(9),
    zi: new Float64Array(9),
    yr: new Float64Array(9),
    yi: new Float64Array(9),
    order: new Int32Array(3),
    aerialYr: 0,
    aerialYi: 0,
    topRe: 0,
    topIm: 0,
  };
}
