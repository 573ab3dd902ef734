import { CHECK_WORDS, OUTCOME_WORDS } from '../../shared/holds/entries';
import { Refusal } from '../../shared/refusal';
import { newId } from '../db/newId';
import type { KindRules } from '../record/kinds';
import { beginHold } from './begin';
import { correctHold, takeCorrectionBack } from './correct';
import { endHold } from './end';
import { aboutHold, openHold } from './openHold';

type Kinds = 'spawnSeen' | 'holdingSeen' | 'holdCheck' | 'holdPlanned' | 'holdCorrected' | 'holdEnded';

/** What Record can say about holds. */
export const holdKinds: Pick<KindRules, Kinds> = {
  spawnSeen: {
    store: (scope, content, { entryId }) => {
      const { onDay, holdId, tankId, colonyId, holderId, parentage, plan, note } = content;
      return beginHold(
        scope,
        {
          holdId,
          tankId,
          colonyId,
          holderId,
          parentage,
          plan,
          note,
          spawnSeen: 1,
          spawnEarliest: onDay,
          spawnLatest: onDay,
          firstSeenOn: onDay,
        },
        entryId,
      );
    },
    say: ({ holderId, tankId }, codes) => `Spawn seen${holderId ? `, ${codes(holderId)}` : ''} in ${codes(tankId)}`,
  },
  holdingSeen: {
    store: (scope, content, { entryId }) => {
      const { kind: _kind, ...beginning } = content;
      if (content.spawnLatest > content.firstSeenOn) {
        throw new Refusal('invalid', 'She cannot have spawned after she was seen holding', {
          spawnLatest: 'Not after the day she was seen',
        });
      }
      return beginHold(scope, { ...beginning, spawnSeen: 0 }, entryId);
    },
    say: ({ holderId, tankId }, codes) =>
      `Holding seen, ${holderId ? codes(holderId) : 'can’t tell which'}, in ${codes(tankId)}`,
  },
  holdCheck: {
    async store(scope, { holdId, onDay, seen, note }, { entryId }) {
      const { db, roomId, actorId, now } = scope;
      const hold = await openHold(scope, holdId, onDay, 'before');
      await db
        .insertInto('holdCheck')
        .values({ roomId, id: newId(now), holdId, onDay, seen, note, actorId, entryId })
        .execute();
      return { onDay, about: aboutHold(hold) };
    },
    say: ({ seen, note }) => `Check: ${CHECK_WORDS[seen].toLowerCase()}${note ? `, ${note}` : ''}`,
  },
  holdPlanned: {
    async store(scope, { holdId, onDay, plan }) {
      const hold = await openHold(scope, holdId, onDay);
      await scope.db
        .updateTable('hold')
        .set({ plan, version: hold.version + 1 })
        .where('roomId', '=', scope.roomId)
        .where('id', '=', holdId)
        .execute();
      return { onDay, about: aboutHold(hold) };
    },
    async undo({ db, roomId }, { holdId, plan }) {
      const other = plan === 'strip' ? 'leave' : 'strip';
      await db.updateTable('hold').set({ plan: other }).where('roomId', '=', roomId).where('id', '=', holdId).execute();
    },
    say: ({ plan }) => (plan === 'strip' ? 'Plan: strip' : 'Plan: leave her'),
  },
  holdCorrected: {
    needs: 'entry:correct',
    store: correctHold,
    undo: takeCorrectionBack,
    say: ({ was, now }, codes) =>
      was.holderId !== now.holderId && now.holderId
        ? `The female is ${codes(now.holderId)}`
        : 'Days of the hold corrected',
  },
  holdEnded: {
    store: endHold,
    say: ({ outcome, brood }) => (brood ? `${OUTCOME_WORDS[outcome]}: ${brood.code}` : OUTCOME_WORDS[outcome]),
  },
};
