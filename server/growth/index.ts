import type { Feature } from '../features';
import { growthRoutes } from './routes';

export { samplesOf, samplesOfBrood } from './samples';
export { growthOfBrood, sizeTodayOf } from './sizes';

export const growth: Feature = { routes: growthRoutes };
