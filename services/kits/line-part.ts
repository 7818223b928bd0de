import type { Knex } from 'knex';
import type { PartId } from '../ids';
import { type PartKind, PartValues, type Place, partKinds } from '../parts/schemas';
import { invalid } from '../problem';

interface PartOfLine {
  code: string;
  kind: PartKind;
  retired: boolean;
}

export async function getPartOfLine(sql: Knex, id: PartId): Promise<PartOfLine> {
  const row = await sql('parts')
    .select('code', 'values', 'retired_at')
    .where({ id })
    .first<{ code: string; values: string; retired_at: number | null } | undefined>();
  if (!row) throw invalid('There is no such part.', { partId: 'There is no such part. Look for another.' });
  return { code: row.code, kind: PartValues.parse(JSON.parse(row.values)).kind, retired: row.retired_at !== null };
}

/** Why a part may not stand in a place, or null. */
export function placeRefusal({ code, kind, retired }: PartOfLine, place: Place): string | null {
  if (retired) return `${code} is retired. Choose another part.`;
  if (partKinds[kind].places.includes(place)) return null;
  return `${code} is a ${partKinds[kind].label.toLowerCase()}; it cannot be the ${place}. Choose another place or part.`;
}
