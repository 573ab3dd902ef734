import type { Feature } from '../features';
import { fishRoutes } from './routes';

export { endStay, letLeave, startStay } from './entries';
export {
  addFinding,
  addFounders,
  freeCodes,
  joinColony,
  keepCode,
  leaveColony,
  mustBeOurs,
  mustLiveHere,
  oneFish,
} from './fish';
export { fishRows } from './rows';

export const fish: Feature = { routes: fishRoutes };
