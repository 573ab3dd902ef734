import type { Feature } from '../features';
import { memberRoutes } from './routes';

export const members: Feature = { routes: memberRoutes };
