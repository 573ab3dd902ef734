import {
  changeParentage,
  exportTable,
  importTable,
  listContradictions,
  mergeFish,
  previewParentage,
  previewTable,
  readParentage,
  readPedigree,
} from '../../shared/lineage/contract';
import type { Feature } from '../features';
import { changeOf, parentageOf, previewOf } from './change';
import { contradictionsOf } from './contradictions';
import { tableOf } from './exportTable';
import { checkTable, takeTable } from './importTable';
import { merge } from './merge';
import { lineageNodes } from './nodes';

export { lineageNodes } from './nodes';
export { keepParentage, parentagesOf } from './parentage';
export { pedigreeOf, type RoomPedigree } from './pedigree';
export { drawKey, foreignNames, type ToldAnimal, toldAnimals } from './told';

export const lineage: Feature = {
  routes: (serve) => {
    serve.read(readPedigree, async (scope, { query }) => ({ nodes: await lineageNodes(scope, query.around) }));
    serve.read(readParentage, (scope, { params }) => parentageOf(scope, params.animalId));
    serve.work(previewParentage, (scope, { params, body }) => previewOf(scope, params.animalId, body));
    serve.write(changeParentage, (scope, { params, body }) => changeOf(scope, params.animalId, body));
    serve.read(exportTable, async (scope) => ({ text: await tableOf(scope) }));
    serve.work(previewTable, async (scope, { body }) => {
      const { rows, bad } = await checkTable(scope, body.text);
      return { rows: rows.length, bad };
    });
    serve.write(importTable, (scope, { body }) => takeTable(scope, body.text));
    serve.write(mergeFish, (scope, { params, body }) => merge(scope, params.fishId, body));
    serve.read(listContradictions, async (scope) => ({ contradictions: await contradictionsOf(scope) }));
  },
};
