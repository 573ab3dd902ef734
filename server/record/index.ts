import type { Feature } from '../features';
import { recordRoutes } from './routes';

export type { Envelope, KindRule, KindRules, Stored } from './kinds';
export { entriesOf, keepEntry, lineOf } from './record';
export { undo } from './undo';

export const record: Feature = { routes: recordRoutes };
