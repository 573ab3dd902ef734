import { addColony, changeColony, listColonies, readColony } from '../../shared/colonies/contract';
import type { Serve } from '../http/serve';
import { changeOne, colonyPage, colonyRows, startColony } from './colonies';

export function colonyRoutes(serve: Serve): void {
  serve.read(listColonies, async (scope) => ({ colonies: await colonyRows(scope) }));
  serve.read(readColony, (scope, { params }) => colonyPage(scope, params.colonyId));
  serve.write(addColony, (scope, { body }) => startColony(scope, body));
  serve.write(changeColony, (scope, { params, body }) => changeOne(scope, params.colonyId, body));
}
