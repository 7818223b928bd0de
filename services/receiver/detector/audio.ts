import type { Ohm, Volt } from '../units';
import { rectifyBehind, type Diode } from './diode';

/** Average depth of programme modulation (common practice). */
export const MODULATION = 0.3;

/**
 * Open audio voltage of a detector: half the difference of the rectified voltages at the crest and the trough of the
 * modulation, along the audio load line through the bias point.
 * Contacts without a measured curve differ by a factor of two and more (E1), and the level by 6 dB with them.
 * @see evaluate.md rule 4; receiver.md E5 for the order of the classes' loudness
 */
export function audioVoltage(d: Diode, open: Volt, source: Ohm, dcLoad: Ohm, audioLoad: Ohm): Volt {
  const bias = rectifyBehind(d, open, source, dcLoad);
  const line = { vdc: bias.vdc, idc: bias.vdc / dcLoad, slope: audioLoad };
  const crest = rectifyBehind(d, open * (1 + MODULATION), source, line);
  const trough = rectifyBehind(d, open * (1 - MODULATION), source, line);
  return (crest.vdc - trough.vdc) / 2;
}
