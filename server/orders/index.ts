import type { Feature } from '../features';
import { standInPages } from '../payments';
import { ownRoutes } from './ownRoutes';
import { startReminders } from './reminders';
import { orderRoutes } from './routes';
import { stripeWebhook } from './webhook';

export { makeOrder } from './make';
export { remind } from './reminders';
export { ordersToday } from './today';

export const orders: Feature = {
  before: stripeWebhook,
  routes: (serve) => {
    orderRoutes(serve);
    ownRoutes(serve);
  },
  pages: standInPages,
  start: async (house) => startReminders(house),
};
