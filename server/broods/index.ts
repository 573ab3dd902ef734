import type { Feature } from '../features';
import { broodRoutes } from './routes';

export { availableOf, reservedOf } from './available';
export { beginBrood } from './begin';
export { batchesBelowZero } from './belowZero';
export { batchesOf, broodRows, oneBatch, oneBrood } from './broods';
export { addLine, countOf, linesOf } from './ledger';
export { changeClaim, claimsOf, freeHeads, holdUntil, reserveHeads } from './reservations';
export { returnHeads } from './returned';
export { sharesOf, sourcesOf } from './sources';

export const broods: Feature = { routes: broodRoutes };
