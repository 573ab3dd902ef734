import type { ContentOf } from '../../shared/record/kinds';
import { Refusal } from '../../shared/refusal';
import { isUniqueViolation } from '../db/constraint';
import { mustBeOurs } from '../fish';
import { keepParentage } from '../lineage';
import type { Scope } from '../scope';
import { alreadyHolding } from './clash';
import { fathersMustNotBeFemale, mayHold } from './parents';

export type Beginning = Pick<
  ContentOf<'holdingSeen'>,
  'holdId' | 'tankId' | 'colonyId' | 'holderId' | 'parentage' | 'plan' | 'note'
> & {
  spawnSeen: 0 | 1;
  spawnEarliest: string;
  spawnLatest: string;
  firstSeenOn: string;
};

export async function beginHold(scope: Scope, beginning: Beginning, entryId: string) {
  const { db, roomId, now } = scope;
  const { holdId, tankId, colonyId, holderId, parentage, firstSeenOn } = beginning;
  await mustBeOurs(scope, 'tank', tankId, 'tankId', 'Choose a tank');
  if (colonyId) await mustBeOurs(scope, 'colony', colonyId, 'colonyId', 'Choose a colony');
  if (beginning.spawnEarliest > beginning.spawnLatest) {
    throw new Refusal('invalid', 'The days are the wrong way round', {
      spawnEarliest: 'Not after the last possible day',
    });
  }
  const strainId = await strainOfHold(scope, holderId, colonyId);
  await fathersMustNotBeFemale(scope, parentage.sires);
  const parentageId = await keepParentage(scope, parentage, { entryId });
  const { parentage: _draft, ...row } = beginning;
  try {
    await db
      .insertInto('hold')
      .values({
        roomId,
        id: holdId,
        ...columnsOf(row),
        parentageId,
        strainId,
        outcome: null,
        endedOn: null,
        endEntryId: null,
        entryId,
        createdAt: now,
      })
      .execute();
  } catch (error) {
    if (isUniqueViolation(error, 'hold.holderId')) throw await alreadyHolding(scope, holderId ?? '');
    throw error;
  }
  const about = [
    { thing: 'hold' as const, id: holdId },
    { thing: 'tank' as const, id: tankId },
    ...(colonyId ? [{ thing: 'colony' as const, id: colonyId }] : []),
    ...(holderId ? [{ thing: 'fish' as const, id: holderId }] : []),
  ];
  return { onDay: firstSeenOn, about, made: { hold: holdId } };
}

const columnsOf = ({
  tankId,
  colonyId,
  holderId,
  plan,
  note,
  spawnSeen,
  spawnEarliest,
  spawnLatest,
  firstSeenOn,
}: Omit<Beginning, 'parentage'>) => ({
  tankId,
  colonyId,
  holderId,
  plan,
  note,
  spawnSeen,
  spawnEarliest,
  spawnLatest,
  firstSeenOn,
});

async function strainOfHold(scope: Scope, holderId: string | null, colonyId: string | null): Promise<string | null> {
  if (holderId) {
    const holder = await mayHold(scope, holderId);
    if (holder.exit) throw new Refusal('invalid', 'This fish has left', { holderId: 'Choose a fish that is here' });
    if (holder.strainId) return holder.strainId;
  }
  if (!colonyId) return null;
  const colony = await scope.db
    .selectFrom('colony')
    .where('roomId', '=', scope.roomId)
    .where('id', '=', colonyId)
    .select('strainId')
    .executeTakeFirst();
  return colony?.strainId ?? null;
}
