import { fetchPartsAt } from '@/components/queries';
import { type PartWanted, nearestPart } from '@/services/kits/rules';
import type { PartView } from '@/services/parts/schemas';
import type { ProblemView } from '@/services/problem';
import { showCapacitance, showResistance } from '@/services/quantity';
import type { LineChange } from './version-store';

type Found =
  { ok: true; parts: { place: PartWanted['place']; part: PartView }[] } | { ok: false; problem: ProblemView };

/** The parts of the catalogue that a remedy asks for; a problem that says what to add where there is none. */
export async function findParts(wanted: readonly PartWanted[]): Promise<Found> {
  const parts: { place: PartWanted['place']; part: PartView }[] = [];
  for (const one of wanted) {
    const offered = await fetchPartsAt(one.place).catch(() => null);
    if (!offered) {
      return {
        ok: false,
        problem: { kind: 'unavailable', sentence: 'The list of parts did not come. Try it again in a moment.' },
      };
    }
    const part = nearestPart(one, offered);
    if (!part) {
      const value = one.place === 'return resistor' ? showResistance(one.value) : showCapacitance(one.value);
      return {
        ok: false,
        problem: {
          kind: 'refused',
          sentence: `No part of about ${value} for the ${one.place}. Add it under Parts first.`,
        },
      };
    }
    parts.push({ place: one.place, part });
  }
  return { ok: true, parts };
}

/** Another part on a line, as the screen shows it until the server answers. */
export const otherPart = (part: PartView): LineChange => ({
  partId: part.id,
  part: { code: part.code, name: part.name, unit: part.unit, massMilligrams: part.massMilligrams, values: part.values },
});
