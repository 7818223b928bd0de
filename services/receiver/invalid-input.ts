export interface Issue {
  path: string;
  message: string;
}

/** What cannot be evaluated, with every issue found: dotted path and a sentence that says what to enter. */
export class InvalidInput extends Error {
  readonly issues: Issue[];

  constructor(issues: Issue[]) {
    super(issues.map(({ path, message }) => (path === '' ? message : `${path}: ${message}`)).join('\n'));
    this.name = 'InvalidInput';
    this.issues = issues;
  }
}

/** Refuses a number that is not finite or lies outside its limits, naming it. */
export function within(path: string, value: number, min: number, max: number): number {
  if (value >= min && value <= max) return value;
  throw new InvalidInput([{ path, message: `Give a number from ${min} to ${max}; ${String(value)} is outside.` }]);
}

/** Refuses a number that is not finite and above zero. */
export function positive(path: string, value: number): number {
  if (value > 0 && value < Infinity) return value;
  throw new InvalidInput([{ path, message: `Give a number above zero; ${String(value)} is not.` }]);
}
