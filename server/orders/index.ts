import type { Feature } from '../features';
import { standInPages } from '../payments';
import { startLapses } from './lapses';
import { ownRoutes } from './ownRoutes';
import { startReminders } from './reminders';
import { orderRoutes } from './routes';
import { stripeWebhook } from './webhook';

export { touchLapsed } from './lapses';
export { makeOrder } from './make';
export { remind } from './reminders';
export { roomAsked } from './room';
export { termsOf } from './terms';
export { ordersToday } from './today';

export const orders: Feature = {
  before: stripeWebhook,
  routes: (serve) => {
    orderRoutes(serve);
    ownRoutes(serve);
  },
  pages: standInPages,
  start: async (house) => {
    const workers = [startReminders(house), startLapses(house)];
    return { stop: async () => void (await Promise.all(workers.map((worker) => worker.stop()))) };
  },
};
