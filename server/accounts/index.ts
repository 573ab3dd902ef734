import type { Feature } from '../features';
import { openLimits } from './limits';
import { linkRoutes } from './linkRoutes';
import { accountRoutes } from './routes';
import { securityRoutes } from './securityRoutes';
import { startSweep } from './sweep';

export { hashPassword } from './passwords';

export { mustKnowPassword } from './security';

export const accounts: Feature = {
  routes: (serve) => {
    const limits = openLimits();
    accountRoutes(serve, limits);
    linkRoutes(serve, limits);
    securityRoutes(serve, limits);
  },
  start: async (house) => startSweep(house),
};
