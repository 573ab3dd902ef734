import { namePages, searchAll } from '../../shared/search/contract';
import type { Feature } from '../features';
import { pagesNamed, searchIn } from './search';

export const search: Feature = {
  routes: (serve) => {
    serve.read(searchAll, async (scope, { query }) => ({ found: await searchIn(scope, query.q ?? '') }));
    serve.read(namePages, async (scope, { query }) => ({ found: await pagesNamed(scope, query.pages ?? []) }));
  },
};
