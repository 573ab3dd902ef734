import { listWater } from '../../shared/water/contract';
import type { Feature } from '../features';
import { careRows, readingRows } from './water';

export { careRows, readingRows } from './water';

export const water: Feature = {
  routes: (serve) => {
    serve.read(listWater, async (scope, { query }) => ({
      readings: await readingRows(scope, query),
      care: await careRows(scope, query),
    }));
  },
};
