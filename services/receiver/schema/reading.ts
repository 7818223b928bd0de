/** Careful reading of a design that may be wrong anywhere. */
export interface Reader {
  root: Record<string, unknown>;
  say: (path: string, message: string) => void;
}

/** The keys of an object; none where there is no object. */
export function keyed(value: unknown): Record<string, unknown> {
  return value !== null && typeof value === 'object' && !Array.isArray(value) ? { ...value } : {};
}

export function listed(value: unknown): unknown[] {
  return Array.isArray(value) ? value : [];
}

/** The number a value stands for, NaN where there is none: every comparison with it is false, so no issue follows. */
export function numberOf(value: unknown): number {
  if (typeof value === 'number') return value;
  const { nominal, lot } = keyed(value);
  const { mean } = keyed(lot);
  if (typeof mean === 'number') return mean;
  return typeof nominal === 'number' ? nominal : NaN;
}
