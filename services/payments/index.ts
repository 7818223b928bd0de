import 'server-only';
export { cancelOrder } from './cancel-order';
export { useStripe } from './client';
export { receiveEvent } from './receive-event';
export { reconcile } from './reconcile';
export { startCheckout } from './start-checkout';
