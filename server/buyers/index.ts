import type { Feature } from '../features';
import { startNotices } from './notices';
import { publicPages } from './publicPages';
import { buyerRoutes, publicRoutes } from './routes';

export { tellThoseWhoWait } from './notices';
export { requestsToday } from './today';

export const buyers: Feature = {
  routes: (serve) => {
    buyerRoutes(serve);
    publicRoutes(serve);
  },
  pages: publicPages,
  start: async (house) => startNotices(house),
};
