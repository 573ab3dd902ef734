import { listAudit } from '../../shared/audit/contract';
import type { Feature } from '../features';
import { trailOf } from './trail';

export const auditTrail: Feature = {
  routes: (serve) => serve.read(listAudit, (scope, { query }) => trailOf(scope, query)),
};
