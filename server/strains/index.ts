import type { Feature } from '../features';
import { strainRoutes } from './routes';

export { addLotTo, addOne as addStrainTo, oneStrain, strainRows } from './strains';

export const strains: Feature = { routes: strainRoutes };
