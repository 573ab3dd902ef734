import type { Feature } from '../features';
import { transferRoutes } from './routes';

export { backUp } from './backup';
export { examine, reportWords } from './doctor';
export { isWhole } from './integrity';
export { restore } from './restore';

export const transfer: Feature = { routes: transferRoutes };
