import { printLabels } from '../../shared/labels/contract';
import type { Feature } from '../features';
import { labelsPdf } from '../print';
import { labelsOf } from './labels';

export const labels: Feature = {
  routes: (serve) => {
    serve.read(printLabels, async (scope, { params, query }, { res }) => {
      const { labels: chosen, fishroom } = await labelsOf(scope, query);
      const from = { fishroom, madeOn: new Date(scope.now), skip: query.skip ?? 0 };
      res.set({
        'Content-Type': 'application/pdf',
        'Content-Disposition': 'inline; filename="labels.pdf"',
        'Cache-Control': 'private, no-store',
      });
      res.send(await labelsPdf(chosen, params.paper, from));
      return null;
    });
  },
};
