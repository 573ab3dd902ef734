import { addTank, changeTank, listTanks, readTank } from '../../shared/tanks/contract';
import type { Serve } from '../http/serve';
import { addOne, allTanks, changeOne, tankPage } from './tanks';

export function tankRoutes(serve: Serve): void {
  serve.read(listTanks, async (scope) => ({ tanks: await allTanks(scope) }));
  serve.read(readTank, (scope, { params }) => tankPage(scope, params.tankId));
  serve.write(addTank, (scope, { body }) => addOne(scope, body));
  serve.write(changeTank, (scope, { params, body }) => changeOne(scope, params.tankId, body));
}
