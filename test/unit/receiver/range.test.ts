import { describe, expect, test } from 'vitest';
import { idealityFrom } from '@/services/receiver/detector/diode';
import { THERMAL_VOLT } from '@/services/receiver/units';
import { flatEarthLimit, stationField } from '@/services/receiver/range/ground-wave';

/** dB above 1 uV/m for 1 kW, from a run of the NTIA program LFMF (public domain), by f, sigma, epsilon and distance. */
const LFMF: [f: number, sigma: number, epsilonR: number, distance: number, dbuvm: number][] = [
  [0.2e6, 0.001, 4, 100e3, 60.59],
  [0.6e6, 0.03, 30, 50e3, 73.88],
  [1e6, 0.01, 15, 10e3, 86.9],
  [1e6, 0.01, 15, 50e3, 64.62],
  [1e6, 0.003, 10, 80e3, 41.87],
  [1.6e6, 0.001, 4, 50e3, 32.24],
];

describe('the field of a station by day', () => {
  test.each(LFMF)(
    'at %d Hz over %d S/m is at most a decibel more cautious than the reference program',
    (f, sigma, epsilonR, distance, wanted) => {
      const field = stationField(1000, { sigma, epsilonR }, f, distance) ?? NaN;
      const off = 20 * Math.log10(field * 1e6) - wanted;
      expect(off).toBeGreaterThan(-1);
      expect(off).toBeLessThan(0.1);
    },
  );

  test('is not estimated beyond three flat-earth limits', () => {
    expect(stationField(50e3, { sigma: 0.003, epsilonR: 10 }, 1e6, 3 * flatEarthLimit(1e6) * 1.001)).toBeNull();
  });
});

test('two forward readings give the ideality they were made with', () => {
  const reading = (i: number) => ({ v: 1.42 * THERMAL_VOLT * 293.15 * Math.log(1 + i / 1e-7) + i * 12, i });
  expect(idealityFrom(reading(1e-5), reading(1e-3), 12, 293.15)).toBeCloseTo(1.42, 2);
});
