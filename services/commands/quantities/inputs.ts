/** Inputs of a check case, read with care: a missing key is a fault of the file. */
export class Inputs {
  constructor(private readonly raw: Readonly<Record<string, unknown>>) {}

  has(key: string): boolean {
    return this.raw[key] !== undefined;
  }

  number(key: string, otherwise?: number): number {
    const value = this.raw[key];
    if (typeof value === 'number') return value;
    if (value === undefined && otherwise !== undefined) return otherwise;
    throw new TypeError(`The case gives no number ${key}.`);
  }

  text(key: string, otherwise?: string): string {
    const value = this.raw[key];
    if (typeof value === 'string') return value;
    if (value === undefined && otherwise !== undefined) return otherwise;
    throw new TypeError(`The case gives no text ${key}.`);
  }

  flag(key: string, otherwise: boolean): boolean {
    const value = this.raw[key];
    return typeof value === 'boolean' ? value : otherwise;
  }

  numbers(key: string): number[] {
    const value = this.raw[key];
    if (Array.isArray(value) && value.every((item) => typeof item === 'number')) return value;
    throw new TypeError(`The case gives no list of numbers ${key}.`);
  }

  texts(key: string): string[] {
    const value = this.raw[key];
    if (Array.isArray(value) && value.every((item) => typeof item === 'string')) return value;
    throw new TypeError(`The case gives no list of texts ${key}.`);
  }

  pairs(key: string): [number, number][] {
    const value = this.raw[key];
    if (!Array.isArray(value)) throw new TypeError(`The case gives no pairs ${key}.`);
    return value.map((item) => {
      const [a, b] = Array.isArray(item) ? item : [];
      if (typeof a !== 'number' || typeof b !== 'number') throw new TypeError(`The case gives no pairs ${key}.`);
      return [a, b];
    });
  }
}

export type Quantity = (inputs: Inputs) => unknown;
export type Quantities = Readonly<Record<string, Quantity>>;
