import { dayWords } from '../../shared/days';
import { EXIT_WORDS } from '../../shared/fish/contract';
import { Refusal } from '../../shared/refusal';
import { newId } from '../db/newId';
import type { Database } from '../db/schema';
import type { KindRules } from '../record/kinds';
import type { Scope } from '../scope';
import { addFinding, joinColony, keepCode, leaveColony, mustBeOurs, mustLiveHere, oneFish } from './fish';
import { fishRows } from './rows';

type Kinds = 'dominant' | 'sexSeen' | 'markSeen' | 'toldApart' | 'fishLeft' | 'moved';

/** What Record can say about single fish, and about moving them, colonies and batches. */
export const fishKinds: Pick<KindRules, Kinds> = {
  dominant: {
    async store(scope, { fishId, onDay, note }, { entryId }) {
      const fish = await livingOurs(scope, fishId);
      if (fish.sex === 'female')
        throw new Refusal('invalid', 'A female is recorded here', {
          fishId: 'Choose a male, or correct the sex first',
        });
      if (fish.tank) await othersYield(scope, { tankId: fish.tank.id, fishId, onDay, entryId });
      await addFinding(scope, { fishId, kind: 'dominance', onDay, value: 'dominant', how: 'seen', note, entryId });
      return { onDay, about: [{ thing: 'fish', id: fishId }] };
    },
    say: ({ fishId }, codes) => `Dominant: ${codes(fishId)}`,
  },
  sexSeen: {
    async store(scope, { fishId, onDay, sex, how, certain, note }, { entryId }) {
      await livingOurs(scope, fishId);
      await addFinding(scope, { fishId, kind: 'sex', onDay, value: sex, how, certain, note, entryId });
      return { onDay, about: [{ thing: 'fish', id: fishId }] };
    },
    say: ({ fishId, sex, certain }, codes) =>
      `${codes(fishId)} ${sex === 'unknown' ? 'not sexed after all' : `is ${certain ? '' : 'probably '}a ${sex}`}`,
  },
  markSeen: {
    async store(scope, { fishId, onDay, mark, note }, { entryId }) {
      await livingOurs(scope, fishId);
      await addFinding(scope, { fishId, kind: 'mark', onDay, value: mark ?? '', how: 'seen', note, entryId });
      return { onDay, about: [{ thing: 'fish', id: fishId }] };
    },
    say: ({ fishId, mark }, codes) => (mark ? `Mark of ${codes(fishId)}: ${mark}` : `${codes(fishId)} has no mark now`),
  },
  toldApart: {
    async store(scope, { fishId, onDay, code, mark, note }, { entryId }) {
      const fish = await livingOurs(scope, fishId);
      if (fish.code)
        throw new Refusal('conflict', `This fish is ${fish.code} already`, { code: 'Change its code on its page' });
      const { db, roomId } = scope;
      await keepCode(code, 'code', () =>
        db
          .updateTable('fish')
          .set({ code, version: fish.version + 1 })
          .where('roomId', '=', roomId)
          .where('id', '=', fishId)
          .execute(),
      );
      if (mark) await addFinding(scope, { fishId, kind: 'mark', onDay, value: mark, how: 'seen', note, entryId });
      return { onDay, about: [{ thing: 'fish', id: fishId }] };
    },
    async undo({ db, roomId }, { fishId }) {
      await db.updateTable('fish').set({ code: null }).where('roomId', '=', roomId).where('id', '=', fishId).execute();
    },
    say: ({ code }) => `Told apart: ${code}`,
  },
  fishLeft: {
    async store(scope, { fishId, onDay, how, cause, note }, { entryId }) {
      await letLeave(scope, { fishId, onDay, kind: how, cause, note, entryId });
      return { onDay, about: [{ thing: 'fish', id: fishId }] };
    },
    say: ({ fishId, how, cause }, codes) =>
      `${codes(fishId)}: ${EXIT_WORDS[how].toLowerCase()}${cause ? `, ${cause}` : ''}`,
  },
  moved: {
    async store(scope, { thing, id, toTankId, onDay, colonyId }, { entryId }) {
      await mustBeOurs(scope, 'tank', toTankId, 'toTankId', 'Choose a tank');
      await mustBeOurs(scope, thing, id, 'id', `Choose a ${thing}`);
      const column = thing === 'colony' ? 'colonyId' : thing === 'batch' ? 'batchId' : 'fishId';
      if (thing === 'fish') await livingOurs(scope, id);
      if (thing === 'fish' && colonyId === null) await leaveColony(scope, { fishId: id, onDay, entryId });
      if (thing === 'fish' && colonyId) await joinColony(scope, { fishId: id, colonyId, onDay, entryId });
      await endStay(scope, column, id, onDay, entryId);
      // A fish that joins a colony lives where the colony lives.
      if (thing !== 'fish' || !colonyId) await startStay(scope, { column, id, tankId: toTankId, onDay, entryId });
      return {
        onDay,
        about: [
          { thing, id },
          { thing: 'tank', id: toTankId },
        ],
      };
    },
    say: ({ id, toTankId, thing }, codes) => `${thing === 'batch' ? 'Batch' : codes(id)} moved to ${codes(toTankId)}`,
  },
};

type Leaving = {
  fishId: string;
  onDay: string;
  kind: Database['fishExit']['kind'];
  cause: string | null;
  note: string | null;
  entryId: string | null;
};

/** A fish leaves the fishroom: its colony, its tank, and the living. */
export async function letLeave(scope: Scope, { fishId, onDay, kind, cause, note, entryId }: Leaving): Promise<void> {
  await livingOurs(scope, fishId);
  const { db, roomId, now } = scope;
  await db
    .insertInto('fishExit')
    .values({ roomId, id: newId(now), fishId, kind, onDay, cause, mergedInto: null, note, entryId })
    .execute();
  await leaveColony(scope, { fishId, onDay, entryId });
  await endStay(scope, 'fishId', fishId, onDay, entryId);
}

async function livingOurs(scope: Scope, fishId: string) {
  await mustLiveHere(scope, { fishId, field: 'fishId', sentence: 'Choose a fish' });
  const fish = await oneFish(scope, fishId);
  if (fish.exit) {
    const { kind, onDay } = fish.exit;
    throw new Refusal(
      'conflict',
      `${fish.code ?? 'This fish'} has left: ${EXIT_WORDS[kind].toLowerCase()} ${dayWords(onDay, scope.today)}`,
      {
        fishId: 'Choose a fish that is here',
      },
    );
  }
  return fish;
}

type Column = 'colonyId' | 'batchId' | 'fishId';

export async function endStay(
  { db, roomId }: Scope,
  column: Column,
  id: string,
  onDay: string,
  entryId: string | null,
): Promise<void> {
  const open = await db
    .selectFrom('stay')
    .where('roomId', '=', roomId)
    .where(column, '=', id)
    .where('untilDay', 'is', null)
    .select(['id', 'fromDay'])
    .executeTakeFirst();
  if (!open) return;
  if (open.fromDay > onDay)
    throw new Refusal('conflict', 'It came to where it is now on a later day', { onDay: `Not before ${open.fromDay}` });
  await db
    .updateTable('stay')
    .set({ untilDay: onDay, endEntryId: entryId })
    .where('roomId', '=', roomId)
    .where('id', '=', open.id)
    .execute();
}

export async function startStay(
  { db, roomId, now }: Scope,
  {
    column,
    id,
    tankId,
    onDay,
    entryId,
  }: { column: Column; id: string; tankId: string; onDay: string; entryId: string | null },
): Promise<void> {
  await db
    .insertInto('stay')
    .values({
      roomId,
      id: newId(now),
      tankId,
      colonyId: null,
      batchId: null,
      fishId: null,
      [column]: id,
      fromDay: onDay,
      untilDay: null,
      entryId,
      endEntryId: null,
    })
    .execute();
}

/** There is one dominant male in a tank: the others are so no longer, from that day. */
async function othersYield(
  scope: Scope,
  { tankId, fishId, onDay, entryId }: { tankId: string; fishId: string; onDay: string; entryId: string },
): Promise<void> {
  for (const other of await fishRows(scope, { living: true })) {
    if (other.id === fishId || !other.dominant || other.tank?.id !== tankId) continue;
    await addFinding(scope, { fishId: other.id, kind: 'dominance', onDay, value: 'notDominant', how: 'seen', entryId });
  }
}
