import { addSpecies, listSpecies, setSpecies } from '../../shared/species/contract';
import type { Feature } from '../features';
import { addOne, setOne, speciesRows } from './species';

export { figuresOf, profileIn, speciesSeen, valuesOf } from './figures';
export { speciesNames } from './names';

export const species: Feature = {
  routes: (serve) => {
    serve.read(listSpecies, async (scope) => ({ set: await speciesRows(scope) }));
    serve.write(setSpecies, (scope, { params, body }) => setOne(scope, params.speciesId, body));
    serve.write(addSpecies, (scope, { body }) => addOne(scope, body));
  },
};
