import type { KitShape } from '@/services/catalogue/schemas';
import type { KitLook } from '@/templates/drawings/kit-drawing';

/** How a kit is drawn, from its parts. */
export function lookOf({ coil, turns, taps, tube, tuning, largest, earphone }: KitShape): KitLook {
  return {
    coil:
      coil === 'flat'
        ? { form: 'flat', spokes: 11, turns }
        : coil === 'rod'
          ? { form: 'rod' }
          : { form: 'tube', turns, taps, ...(tube && { tube }) },
    tuning,
    ...(largest !== null && { largest }),
    earphone,
  };
}
