import { readPedigree } from '../../shared/lineage/contract';
import type { Feature } from '../features';
import { lineageNodes } from './nodes';

export { lineageNodes } from './nodes';
export { keepParentage, parentagesOf } from './parentage';
export { pedigreeOf, type RoomPedigree } from './pedigree';
export { drawKey, foreignNames, type ToldAnimal, toldAnimals } from './told';

export const lineage: Feature = {
  routes: (serve) => {
    serve.read(readPedigree, async (scope, { query }) => ({ nodes: await lineageNodes(scope, query.around) }));
  },
};
