import 'server-only';
export { hold } from './hold';
export { release } from './release';
export { callBack, sendToCheck } from './send-to-check';
export { listDecided, readQueue, readSheet, readSignOff } from './views';
export { withdraw } from './withdraw';
