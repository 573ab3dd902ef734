import type { Feature } from '../features';
import { strainRoutes } from './routes';

export { oneStrain, strainRows } from './strains';

export const strains: Feature = { routes: strainRoutes };
