import { notFound } from '../../shared/refusal';
import { newId } from '../db/newId';
import type { KindRules } from '../record/kinds';

/** What Record can say about single fish. */
export const fishKinds: Pick<KindRules, 'dominant'> = {
  dominant: {
    async store(scope, { fishId, onDay, note }, { entryId }) {
      const { db, roomId, actorId, now } = scope;
      const fish = await db
        .selectFrom('fish')
        .where('roomId', '=', roomId)
        .where('id', '=', fishId)
        .select('id')
        .executeTakeFirst();
      if (!fish) throw notFound('That fish');
      await db
        .insertInto('finding')
        .values({
          roomId,
          id: newId(now),
          fishId,
          kind: 'dominance',
          onDay,
          value: 'dominant',
          how: 'seen',
          note,
          actorId,
          at: now,
          entryId,
        })
        .execute();
      return { onDay, about: [{ thing: 'fish', id: fishId }] };
    },
    say: ({ fishId }, codes) => `Dominant: ${codes(fishId)}`,
  },
};
