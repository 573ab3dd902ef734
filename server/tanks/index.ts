import type { Feature } from '../features';
import { tankRoutes } from './routes';

export { type Presence, presenceIn } from './presence';
export { staysOf } from './residents';
export { addOne, allTanks, oneTank } from './tanks';

export const tanks: Feature = { routes: tankRoutes };
