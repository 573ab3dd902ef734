import type { Feature } from '../features';
import { photoRoutes } from './routes';
import { sweepPictures } from './sweep';

export { photoRows } from './photos';

export const photos: Feature = { routes: photoRoutes, start: sweepPictures };
