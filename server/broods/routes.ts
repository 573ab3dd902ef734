import { changeBrood, listBroods, proposeBrood, readBatch, readBrood } from '../../shared/broods/contract';
import type { Serve } from '../http/serve';
import { broodPage, broodRows, changeOne, nextCode, oneBatch } from './broods';

export function broodRoutes(serve: Serve): void {
  serve.read(listBroods, async (scope, { query }) => ({
    broods: await broodRows(scope, { hereOnly: query.which !== 'all' }),
  }));
  serve.read(readBrood, (scope, { params }) => broodPage(scope, params.broodId));
  serve.read(readBatch, (scope, { params }) => oneBatch(scope, params.batchId));
  serve.write(changeBrood, (scope, { params, body }) => changeOne(scope, params.broodId, body));
  serve.read(proposeBrood, async (scope, { query }) => ({ code: await nextCode(scope, query.strainId, query.onDay) }));
}
