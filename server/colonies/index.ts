import type { Feature } from '../features';
import { colonyRoutes } from './routes';

export { colonyRows, oneColony, startColony } from './colonies';

export const colonies: Feature = { routes: colonyRoutes };
