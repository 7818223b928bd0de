import type { Chance } from './chance';
import { runOn } from './programs';

/** An aerial wire over perfect ground: a riser from the ground and a top wire, 0 for none; metre and hertz. */
export interface Wire {
  riser: number;
  top: number;
  radius: number;
  f: number;
}

const C = 299792458;

/** A wire of a garden, at a frequency that makes it so many radians long. */
export function randomWire(chance: Chance, bent: boolean, span: { from: number; to: number }): Wire {
  const riser = chance.linear(3, 12);
  const top = bent ? chance.linear(5, 35) : 0;
  const radius = chance.log(2e-4, 3e-3);
  const angle = chance.linear(span.from, span.to);
  return { riser, top, radius, f: (angle * C) / (2 * Math.PI * (riser + top)) };
}

/**
 * Length of a segment of the simulated wire: at most 0.25 m, and a fortieth of the riser, since the feed lies half a
 * segment above the ground (0.25 m at the foot of a riser of 4 m would shorten it by 3 %); not below ten radii.
 */
function segmentOf({ riser, radius }: Wire): number {
  return Math.max(10 * radius, Math.min(0.25, riser / 40));
}

export interface Feed {
  r: number;
  x: number;
}

/** Impedance at the foot of the wire by the method of moments. */
export function fedAtTheFoot(wire: Wire): Feed {
  const { riser, top, radius, f } = wire;
  const segment = segmentOf(wire);
  const segments = (length: number): number => Math.max(3, Math.round(length / segment));
  const cards = ['CM wire', 'CE', `GW 1 ${segments(riser)} 0 0 0 0 0 ${riser} ${radius}`];
  if (top > 0) cards.push(`GW 2 ${segments(top)} 0 0 ${riser} ${top} 0 ${riser} ${radius}`);
  cards.push('GE 1', 'GN 1', 'EX 0 1 1 0 1 0', `FR 0 1 0 0 ${f / 1e6} 0`, 'XQ', 'EN', '');
  return runOn('nec2c', ['-i', 'wire.nec', '-o', 'wire.out'], { 'wire.nec': cards.join('\n') }, ({ file }) => {
    const rows = file('wire.out').split('\n');
    const head = rows.findIndex((row) => row.includes('ANTENNA INPUT PARAMETERS'));
    const row = rows.slice(head).find((line) => /^\s+1\s+1\s/.test(line)) ?? '';
    // Tag, segment, voltage, current, impedance (real and imaginary each), admittance, power.
    const [, , , , , , r = NaN, x = NaN] = row.trim().split(/\s+/).map(Number);
    return { r, x };
  });
}
