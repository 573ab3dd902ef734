import type { Feature } from '../features';
import { colonyRoutes } from './routes';

export { colonyRows, oneColony } from './colonies';

export const colonies: Feature = { routes: colonyRoutes };
