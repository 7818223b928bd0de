import type { Clock } from './clock';
import type { Deliveries } from './deliveries';
import type { Settings } from './options';
import type { Store } from './store';
import type { FaultPlan, Switches } from './switches';

/** Everything one running stand-in consists of. */
export interface World {
  settings: Settings;
  clock: Clock;
  store: Store;
  switches: Switches;
  faults: FaultPlan;
  deliveries: Deliveries;
  /** Where the browser finds the hosted page, without a slash at the end. */
  origin: string;
  /** Writes the state file, where there is one. */
  save: () => void;
}
