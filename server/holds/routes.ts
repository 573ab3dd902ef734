import { listHolds, proposeSires, readHold } from '../../shared/holds/contract';
import type { Serve } from '../http/serve';
import { holdPage, holdRows } from './holds';
import { siresFor } from './sires';

export function holdRoutes(serve: Serve): void {
  serve.read(listHolds, async (scope, { query }) => {
    const { which, colonyId, holderId } = query;
    return { holds: await holdRows(scope, { open: which !== 'all', colonyId, holderId }) };
  });
  serve.read(readHold, (scope, { params }) => holdPage(scope, params.holdId));
  serve.read(proposeSires, (scope, { params, query }) => siresFor(scope, params.tankId, query));
}
