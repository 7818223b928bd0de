import { QUANTITIES } from './case-quantities';
import { Inputs } from './quantities/inputs';

/** A check case as the reference files carry it: values plain or structured, tolerance relative unless it is absolute. */
export interface CheckCase {
  id: string;
  quantity: string;
  inputs: Readonly<Record<string, unknown>>;
  expected: unknown;
  toleranceRelative: number | null;
  tolerance: number | null;
}

export type Outcome = 'ok' | 'off' | 'unknown';

export interface Judged {
  outcome: Outcome;
  got: unknown;
}

/** Where zero is expected a relative tolerance says nothing; this holds instead. */
const AT_ZERO = 1e-9;

function isRecord(value: unknown): value is Record<string, unknown> {
  return value !== null && typeof value === 'object' && !Array.isArray(value);
}

/** Reads the cases of a file; throws a sentence where the file is no list of cases. */
export function readCases(content: unknown): CheckCase[] {
  const list = isRecord(content) ? content['cases'] : content;
  if (!Array.isArray(list)) throw new TypeError('The file holds no list of cases.');
  return list.map((item: unknown, index) => {
    if (!isRecord(item)) throw new TypeError(`Case ${index + 1} is no object.`);
    const { id, quantity, topic, inputs, expected, tolerance_rel: relative, tolerance } = item;
    return {
      id: typeof id === 'string' ? id : `case ${index + 1}`,
      quantity: typeof quantity === 'string' ? quantity : typeof topic === 'string' ? topic : '',
      inputs: isRecord(inputs) ? inputs : {},
      expected,
      toleranceRelative: typeof relative === 'number' ? relative : null,
      tolerance: typeof tolerance === 'number' ? tolerance : null,
    };
  });
}

/** Runs one case through the engine. A function that throws is off: its sentence stands in place of the value. */
export function judge(check: CheckCase): Judged {
  const quantity = QUANTITIES[check.quantity];
  if (quantity === undefined || !Object.hasOwn(QUANTITIES, check.quantity)) return { outcome: 'unknown', got: null };
  let got: unknown;
  try {
    got = quantity(new Inputs(check.inputs));
  } catch (error) {
    return { outcome: 'off', got: error instanceof Error ? error.message : String(error) };
  }
  return { outcome: agrees(got, check.expected, check) ? 'ok' : 'off', got };
}

function agrees(got: unknown, expected: unknown, check: CheckCase): boolean {
  if (typeof expected === 'number') return typeof got === 'number' && near(got, expected, check);
  if (Array.isArray(expected)) {
    return (
      Array.isArray(got) && got.length === expected.length && expected.every((item, i) => agrees(got[i], item, check))
    );
  }
  if (isRecord(expected)) {
    return isRecord(got) && Object.entries(expected).every(([key, value]) => agrees(got[key], value, check));
  }
  return got === expected;
}

function near(got: number, expected: number, { toleranceRelative, tolerance }: CheckCase): boolean {
  const apart = Math.abs(got - expected);
  if (tolerance !== null && apart <= tolerance) return true;
  const relative = toleranceRelative ?? 0;
  return apart <= (expected === 0 && relative > 0 ? AT_ZERO : relative * Math.abs(expected));
}
