import type { Feature } from '../features';
import { recordRoutes } from './routes';

export type { Envelope, KindRule, KindRules, Stored } from './kinds';
export { keepEntry } from './record';

export const record: Feature = { routes: recordRoutes };
