import type { Feature } from '../features';
import { holdRoutes } from './routes';

export { clockFactsFor } from './clockFacts';
export { holdRows, mayBeHybrid, oneHold } from './holds';

export const holds: Feature = { routes: holdRoutes };
