import type { Feature } from '../features';
import { deleteInTime } from './deleteRoom';
import { transferRoutes } from './routes';

export { backUp } from './backup';
export { deleteDue } from './deleteRoom';
export { examine, reportWords } from './doctor';
export { isWhole } from './integrity';
export { restore } from './restore';

export const transfer: Feature = { routes: transferRoutes, start: deleteInTime };
