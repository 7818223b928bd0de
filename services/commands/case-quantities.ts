import { aerialQuantities } from './quantities/aerial';
import { bandQuantities } from './quantities/band';
import { capacitorQuantities } from './quantities/capacitors';
import { coilQuantities } from './quantities/coils';
import { detectorQuantities } from './quantities/detector';
import { networkQuantities } from './quantities/network';
import { toleranceQuantities } from './quantities/tolerance';
import type { Quantity } from './quantities/inputs';

/** From the quantity (or topic) of a check case to the function that answers it; the cases command and the tests share it. */
export const QUANTITIES: Readonly<Record<string, Quantity>> = {
  ...bandQuantities,
  ...aerialQuantities,
  ...networkQuantities,
  ...toleranceQuantities,
  ...detectorQuantities,
  ...coilQuantities,
  ...capacitorQuantities,
};
