import 'server-only';
export { setPrice } from './set-price';
export { listOnSale, listPriced, priceFor, readKitPage } from './views';
export { pricesOf as priceSteps } from './rows';
