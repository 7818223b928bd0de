import { fieldAt } from '../audio';
import type { Figures } from '../figures';
import { aerialHeight } from '../network/solve';
import { shownQuantity, type Found } from './finding';

interface Usual {
  unit: string;
  least: number;
  most: number;
}

/** Magnitudes between which these sets lie. @see receiver.md, numerical rule 5 */
const USUAL: Record<string, Usual> = {
  'aerial.l': { unit: 'H', least: 3e-6, most: 40e-6 },
  'aerial.c': { unit: 'F', least: 50e-12, most: 400e-12 },
  'earth.r': { unit: 'ohm', least: 10, most: 150 },
  'coil.l': { unit: 'H', least: 20e-6, most: 5e-3 },
  'coil.q': { unit: '1', least: 30, most: 400 },
  'tuning.min': { unit: 'F', least: 5e-12, most: 1000e-12 },
  'tuning.max': { unit: 'F', least: 5e-12, most: 1000e-12 },
  'tuning.c': { unit: 'F', least: 5e-12, most: 1000e-12 },
  'tuning.c.min': { unit: 'F', least: 5e-12, most: 1000e-12 },
  'tuning.c.max': { unit: 'F', least: 5e-12, most: 1000e-12 },
};

const VARIABLE: Usual = { unit: 'H', least: 20e-6, most: 5e-3 };
const EMF: Usual = { unit: 'V', least: 1e-3, most: 1 };

/** Fields inside their limits but outside the usual magnitudes: often a slip of the unit. */
export function unusual({ plan, design, soundings: [, middle] }: Figures): Found[] {
  const found: Found[] = [];
  const look = (path: string, value: number, { unit, least, most }: Usual): void => {
    if (value >= least && value <= most) return;
    const message = `Unusual value: ${path} ${shownQuantity(value, unit === 'ohm' ? 'Ω' : unit)}. Check the unit.`;
    found.push({ code: 'UNIT-ODD', severity: 'info', path, value, limit: value < least ? least : most, unit, message });
  };
  for (const { path, centre } of plan.values.entries) {
    const variable = design.tuning.kind === 'inductance' && (path === 'tuning.min' || path === 'tuning.max');
    const usual = variable ? VARIABLE : USUAL[path];
    if (usual !== undefined) look(path, centre, usual);
  }
  if (design.place !== undefined)
    look('place.field', fieldAt(design) * Math.abs(aerialHeight(plan.circuit, middle.f)), EMF);
  return found;
}
