import type { About } from '../../shared/record/contract';
import { sourcesOf } from '../broods';
import { mustBeOurs } from '../fish';
import type { KindRules } from '../record/kinds';

/** What Record can say about lengths. */
export const growthKinds: Pick<KindRules, 'lengthSampled'> = {
  lengthSampled: {
    async store(scope, { sampleId, of, onDay, measure, method, readings, note }, { entryId }) {
      const { db, roomId, actorId, now } = scope;
      await mustBeOurs(scope, of.thing, of.id, 'of.id', `Choose a ${of.thing}`);
      await db
        .insertInto('lengthSample')
        .values({
          roomId,
          id: sampleId,
          broodId: null,
          batchId: null,
          fishId: null,
          [`${of.thing}Id`]: of.id,
          onDay,
          measure,
          method,
          note,
          actorId,
          entryId,
          createdAt: now,
        })
        .execute();
      await db
        .insertInto('lengthReading')
        .values(readings.map((reading, position) => ({ roomId, sampleId, position, ...reading })))
        .execute();
      const broods = of.thing === 'batch' ? ((await sourcesOf(scope, [of.id])).get(of.id) ?? []) : [];
      return {
        onDay,
        about: [of, ...broods.map(({ broodId }): About => ({ thing: 'brood', id: broodId }))],
        made: { sample: sampleId },
      };
    },
    say: ({ readings, measure }) => {
      const mean = readings.reduce((sum, { lengthTenthsMm }) => sum + lengthTenthsMm, 0) / readings.length;
      return `Length sample: ${readings.length} fish, mean ${(mean / 100).toFixed(1)} cm ${measure} length`;
    },
  },
};
