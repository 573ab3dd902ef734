import { addFish, changeFish, listFish, proposeFishCodes, readFish } from '../../shared/fish/contract';
import type { Serve } from '../http/serve';
import { addFounders, changeOne, fishPage, freeCodes } from './fish';
import { fishRows } from './rows';

export function fishRoutes(serve: Serve): void {
  serve.read(listFish, async (scope, { query }) => ({
    fish: await fishRows(scope, { living: query.which !== 'all' }),
  }));
  serve.read(readFish, (scope, { params }) => fishPage(scope, params.fishId));
  serve.write(addFish, async (scope, { body }) => ({ fish: await addFounders(scope, body) }));
  serve.write(changeFish, (scope, { params, body }) => changeOne(scope, params.fishId, body));
  serve.read(proposeFishCodes, async (scope, { query }) => ({
    codes: await freeCodes(scope, query.stem, query.count ?? 1),
  }));
}
