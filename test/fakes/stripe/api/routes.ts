import { customerRoutes } from './customer-routes';
import { eventRoutes } from './event-routes';
import { paymentRoutes } from './payment-routes';
import { refundRoutes } from './refund-routes';
import type { Route } from './route';
import { sessionRoutes } from './session-routes';

export const ROUTES: readonly Route[] = [
  ...sessionRoutes,
  ...paymentRoutes,
  ...refundRoutes,
  ...customerRoutes,
  ...eventRoutes,
];
