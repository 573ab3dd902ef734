import type { Feature } from '../features';
import { roomRoutes } from './routes';

export { roomPage, unitsOf } from './rooms';

export const rooms: Feature = { routes: roomRoutes };
