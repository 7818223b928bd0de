import type { Finding } from '../verdict';

/** A finding before its remedy is worked out. */
export type Found = Omit<Finding, 'remedy'>;

/** A frequency as the trade says it: kHz below 3 MHz, MHz above. */
export function shownFrequency(f: number): string {
  return f < 3e6 ? `${(f / 1000).toFixed(1)} kHz` : `${(f / 1e6).toFixed(3)} MHz`;
}

export function shownPercent(share: number, digits = 1): string {
  return `${(share * 100).toFixed(digits)} %`;
}

/** A quantity with a prefix and three figures. */
export function shownQuantity(value: number, unit: string): string {
  if (value === 0 || unit === '' || unit === '1')
    return `${Number(value.toPrecision(3))}${unit === '' || unit === '1' ? '' : ` ${unit}`}`;
  const steps: [number, string][] = [
    [1e9, 'G'],
    [1e6, 'M'],
    [1e3, 'k'],
    [1, ''],
    [1e-3, 'm'],
    [1e-6, '\u00b5'],
    [1e-9, 'n'],
    [1e-12, 'p'],
    [1e-15, 'f'],
  ];
  const size = Math.abs(value);
  const step = steps.find(([scale]) => size >= scale * 0.9995) ?? steps[steps.length - 1];
  if (step === undefined) return `${value} ${unit}`;
  return `${Number((value / step[0]).toPrecision(3))} ${step[1]}${unit}`;
}
