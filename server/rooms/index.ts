import type { Feature } from '../features';
import { roomRoutes } from './routes';

export { unitsOf } from './rooms';

export const rooms: Feature = { routes: roomRoutes };
