import { listSamples, listStrainSamples } from '../../shared/growth/contract';
import type { Serve } from '../http/serve';
import { samplesPage, strainSamples } from './samples';

export function growthRoutes(serve: Serve): void {
  serve.read(listSamples, (scope, { query }) => samplesPage(scope, query.thing, query.thingId));
  serve.read(listStrainSamples, (scope, { params }) => strainSamples(scope, params.strainId));
}
