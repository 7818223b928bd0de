import { log10 } from '../numeric/exp-log';
import type { Hertz } from '../units';

export type Environment = 'city' | 'residential' | 'rural' | 'quiet-rural';

/** Man-made noise: c - d log10 f in MHz (ITU-R P.372 as several public programs carry it). */
const MAN_MADE: Record<Environment, readonly [c: number, d: number]> = {
  city: [76.8, 27.7],
  residential: [72.5, 27.7],
  rural: [67.2, 27.7],
  'quiet-rural': [53.6, 28.6],
};

/** Median man-made noise figure, decibel. */
export function manMadeNoise(environment: Environment, f: Hertz): number {
  const [c, d] = MAN_MADE[environment];
  return c - d * log10(f / 1e6);
}

/**
 * Noise field at a short vertical, dB above 1 uV/m (ITU-R P.372's form). Local switching can lie far above it. @see
 * receiver.md G3
 */
export function noiseField(figureDb: number, f: Hertz, bandwidth: Hertz): number {
  return figureDb + 20 * log10(f / 1e6) + 10 * log10(bandwidth) - 95.5;
}
