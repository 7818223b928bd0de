import type { Design } from '../design';

/** Where the coil is divided: ends of the sections from the earth end, and the nodes that aerial and detector use. */
export interface Cuts {
  /** Upper end of each section; the last is the whole coil. Turns, or numbers of measured sections. */
  ends: number[];
  aerialNode: number;
  detectorNode: number;
}

/** Only taps that are in use divide the coil: an open tap changes nothing. */
export function cutsOf({ coil, coupling, detectorAt }: Design, whole: number): Cuts {
  const aerial = coupling.kind === 'aerial-tap' ? coil.taps?.aerial : undefined;
  const detector = detectorAt === 'tap' ? coil.taps?.detector : undefined;
  const taps = [aerial, detector].filter((tap) => tap !== undefined);
  const ends = [...new Set(taps)].sort((a, b) => a - b);
  ends.push(whole);
  const nodeAt = (tap: number | undefined): number => (tap === undefined ? ends.length - 1 : ends.indexOf(tap));
  return {
    ends,
    aerialNode: coupling.kind === 'primary' ? ends.length : nodeAt(aerial),
    detectorNode: nodeAt(detector),
  };
}
