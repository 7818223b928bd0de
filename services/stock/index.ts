import 'server-only';
export { acceptLot } from './accept-lot';
export { allocate } from './allocate';
export { giveBack, lapseDue } from './lapse';
export { pick, putBack } from './pick';
export { receiveLot } from './receive-lot';
export { reserve } from './reserve';
export { takeOut } from './take-out';
export { availableOf, buildable, needsOf, readStore, suggestLots } from './views';
