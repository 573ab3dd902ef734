import type { Feature } from '../features';
import { growthRoutes } from './routes';

export { samplesOf, samplesOfBrood } from './samples';

export const growth: Feature = { routes: growthRoutes };
