/** One field that two people set to different values. */
export interface FieldConflict {
  /** Dotted path of the field: "winding.turns". */
  path: string;
  label: string;
  mine: string;
  theirs: string;
  values: { mine: unknown; theirs: unknown };
}

export interface Merged<T> {
  /** Theirs, with every field that only I changed. */
  value: T;
  /** Fields both changed, and not to the same value. */
  conflicts: FieldConflict[];
}

/** Joins two changes of the same thing, field by field; lists are one field each. */
export function mergeFields<T extends object>({ base, mine, theirs }: { base: T; mine: T; theirs: T }): Merged<T> {
  const conflicts: FieldConflict[] = [];
  let value: unknown = theirs;
  const fields = new Map([...leaves(base), ...leaves(mine), ...leaves(theirs)]);
  for (const path of fields.keys()) {
    const [was, here, there] = [at(base, path), at(mine, path), at(theirs, path)];
    if (same(here, was) || same(here, there)) continue;
    if (same(there, was)) value = put(value, path.split('.'), here);
    else
      conflicts.push({
        path,
        label: labelOf(path),
        mine: words(here),
        theirs: words(there),
        values: { mine: here, theirs: there },
      });
  }
  // Built by replacing leaves of a T with leaves of another T.
  return { value: value as T, conflicts };
}

/** Theirs with the fields chosen as mine. */
export function settled<T extends object>(
  theirs: T,
  fields: readonly FieldConflict[],
  choices: ReadonlyMap<string, 'mine' | 'theirs'>,
): T {
  let value: unknown = theirs;
  for (const { path, values } of fields) {
    if (choices.get(path) === 'mine') value = put(value, path.split('.'), values.mine);
  }
  // As above: leaves of the same form.
  return value as T;
}

const isBranch = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

function leaves(value: unknown, prefix = ''): [string, true][] {
  if (!isBranch(value)) return [[prefix, true]];
  return Object.entries(value).flatMap(([key, inner]) => leaves(inner, prefix === '' ? key : `${prefix}.${key}`));
}

function at(value: unknown, path: string): unknown {
  return path.split('.').reduce<unknown>((inner, key) => (isBranch(inner) ? inner[key] : undefined), value);
}

function put(value: unknown, [key, ...rest]: string[], leaf: unknown): unknown {
  if (key === undefined) return leaf;
  const branch = isBranch(value) ? value : {};
  const { [key]: inner, ...others } = branch;
  if (rest.length === 0 && leaf === undefined) return others;
  return { ...branch, [key]: put(inner, rest, leaf) };
}

const same = (a: unknown, b: unknown) => JSON.stringify(a) === JSON.stringify(b);

const labels: Record<string, string> = {
  'winding.turns': 'Turns',
  'winding.pitch': 'Pitch',
  'winding.aerialTap': 'Aerial tap',
  'winding.detectorTap': 'Detector tap',
  'winding.tolerance': 'Winding tolerance',
  coupling: 'Coupling',
  detectorAt: 'Detector place',
  'aerial.vertical': 'Aerial riser',
  'aerial.horizontal': 'Aerial, level part',
  'earth.kind': 'Earth',
  'earth.r.nominal': 'Earth resistance',
  'stray.nominal': 'Stray capacitance',
  intro: 'Introduction',
  steps: 'Steps',
  cautions: 'Cautions',
};
const labelOf = (path: string) => labels[path] ?? path;

function words(value: unknown): string {
  if (value === null || value === undefined) return 'none';
  if (Array.isArray(value)) return `${value.length} entries`;
  return typeof value === 'string' && value !== '' ? value : String(value) || 'empty';
}
