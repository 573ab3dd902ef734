import type { Feature } from '../features';
import { accountRoutes } from './routes';

export const accounts: Feature = { routes: accountRoutes };
