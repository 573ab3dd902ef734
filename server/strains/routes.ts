import { addLot, addStrain, changeStrain, listStrains, readStrain } from '../../shared/strains/contract';
import type { Serve } from '../http/serve';
import { addLotTo, addOne, changeOne, strainPage, strainRows } from './strains';

export function strainRoutes(serve: Serve): void {
  serve.read(listStrains, async (scope) => ({ strains: await strainRows(scope) }));
  serve.read(readStrain, (scope, { params }) => strainPage(scope, params.strainId));
  serve.write(addStrain, (scope, { body }) => addOne(scope, body));
  serve.write(changeStrain, (scope, { params, body }) => changeOne(scope, params.strainId, body));
  serve.write(addLot, (scope, { params, body }) => addLotTo(scope, params.strainId, body));
}
