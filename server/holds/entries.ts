import { dayWords } from '../../shared/days';
import { CHECK_WORDS, OUTCOME_WORDS } from '../../shared/holds/entries';
import type { ContentOf } from '../../shared/record/kinds';
import { Refusal } from '../../shared/refusal';
import { beginBrood } from '../broods';
import { isUniqueViolation } from '../db/constraint';
import { newId } from '../db/newId';
import { addFinding, mustBeOurs, oneFish } from '../fish';
import { keepParentage, parentagesOf } from '../lineage';
import type { KindRules } from '../record/kinds';
import type { Scope } from '../scope';
import { mayBeHybrid, oneHold } from './holds';

type Kinds = 'spawnSeen' | 'holdingSeen' | 'holdCheck' | 'holdPlanned' | 'holdEnded';

type Beginning = Pick<
  ContentOf<'holdingSeen'>,
  'holdId' | 'tankId' | 'colonyId' | 'holderId' | 'parentage' | 'plan' | 'note'
> & {
  spawnSeen: 0 | 1;
  spawnEarliest: string;
  spawnLatest: string;
  firstSeenOn: string;
};

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
      const hold = await openHold(scope, holdId, onDay);
      await db
        .insertInto('holdCheck')
        .values({ roomId, id: newId(now), holdId, onDay, seen, note, actorId, entryId })
        .execute();
      return { onDay, about: aboutHold(hold) };
    },
    say: ({ seen }) => `Check: ${CHECK_WORDS[seen].toLowerCase()}`,
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
  holdEnded: {
    store: endHold,
    say: ({ outcome, brood }) => (brood ? `${OUTCOME_WORDS[outcome]}: ${brood.code}` : OUTCOME_WORDS[outcome]),
  },
};

async function beginHold(scope: Scope, beginning: Beginning, entryId: string) {
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
    await mustBeOurs(scope, 'fish', holderId, 'holderId', 'Choose a fish');
    const holder = await oneFish(scope, holderId);
    if (holder.sex === 'male')
      throw new Refusal('invalid', 'A male is recorded here', {
        holderId: 'Choose a female, or correct the sex first',
      });
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

async function fathersMustNotBeFemale(scope: Scope, sires: { fishId: string | null }[]): Promise<void> {
  for (const [i, { fishId }] of sires.entries()) {
    if (!fishId) continue;
    await mustBeOurs(scope, 'fish', fishId, `parentage.sires.${i}.fishId`, 'Choose a fish');
    const fish = await oneFish(scope, fishId);
    if (fish.sex === 'female') {
      throw new Refusal('invalid', `${fish.code ?? 'This fish'} is recorded as a female`, {
        [`parentage.sires.${i}.fishId`]: 'A female cannot be the father',
      });
    }
  }
}

/** Two people saw the same mouth: the record that is there already is shown beside the new one. */
async function alreadyHolding(scope: Scope, holderId: string): Promise<Refusal> {
  const open = await scope.db
    .selectFrom('hold')
    .where('roomId', '=', scope.roomId)
    .where('holderId', '=', holderId)
    .where('endedOn', 'is', null)
    .select(['id', 'entryId'])
    .executeTakeFirstOrThrow();
  const hold = await oneHold(scope, open.id);
  return new Refusal(
    'conflict',
    `She is recorded as holding already, first seen ${dayWords(hold.firstSeenOn, scope.today)}`,
    { holderId: 'Already holding' },
    { current: { hold, entryId: open.entryId } },
  );
}

async function openHold(scope: Scope, holdId: string, onDay: string) {
  await mustBeOurs(scope, 'hold', holdId, 'holdId', 'Choose a hold');
  const hold = await oneHold(scope, holdId);
  if (hold.outcome && hold.endedOn) {
    throw new Refusal(
      'conflict',
      `This hold has ended: ${OUTCOME_WORDS[hold.outcome].toLowerCase()} ${dayWords(hold.endedOn, scope.today)}`,
      {},
      { current: { hold } },
    );
  }
  if (onDay < hold.spawnEarliest)
    throw new Refusal('invalid', 'That is before the spawn', { onDay: `Not before ${hold.spawnEarliest}` });
  return hold;
}

const aboutHold = (hold: Awaited<ReturnType<typeof oneHold>>) => [
  { thing: 'hold' as const, id: hold.id },
  { thing: 'tank' as const, id: hold.tank.id },
  ...(hold.colony ? [{ thing: 'colony' as const, id: hold.colony.id }] : []),
  ...(hold.holder ? [{ thing: 'fish' as const, id: hold.holder.id }] : []),
];

async function endHold(scope: Scope, content: ContentOf<'holdEnded'>, { entryId }: { entryId: string }) {
  const { db, roomId, now } = scope;
  const { holdId, onDay, outcome, brood, note } = content;
  const hold = await openHold(scope, holdId, onDay);
  const makesBrood = outcome === 'stripped' || outcome === 'released';
  if (makesBrood && !brood)
    throw new Refusal('invalid', 'A strip or a release starts a brood', { brood: 'Give the brood a code and a tank' });
  if (!makesBrood && brood)
    throw new Refusal('invalid', `${OUTCOME_WORDS[outcome]}: there is no brood`, { brood: 'Leave the brood out' });
  if (outcome === 'stripped' && hold.mode && hold.mode !== 'maternalMouthbrooder') {
    throw new Refusal('invalid', 'This species is not stripped', { outcome: 'Choose how it ended' });
  }
  await db
    .updateTable('hold')
    .set({ outcome, endedOn: onDay, endEntryId: entryId, version: hold.version + 1 })
    .where('roomId', '=', roomId)
    .where('id', '=', holdId)
    .execute();
  if (outcome === 'diedHolding' && hold.holder) {
    await db
      .insertInto('fishExit')
      .values({
        roomId,
        id: newId(now),
        fishId: hold.holder.id,
        kind: 'died',
        onDay,
        cause: 'died holding',
        mergedInto: null,
        note,
        entryId,
      })
      .execute();
  }
  if (note && hold.holder)
    await addFinding(scope, {
      fishId: hold.holder.id,
      kind: 'check',
      onDay,
      value: OUTCOME_WORDS[outcome],
      how: 'seen',
      note,
      entryId,
    });
  if (!brood) return { onDay, about: aboutHold(hold) };
  const { parentageId, strainId } = await db
    .selectFrom('hold')
    .where('roomId', '=', roomId)
    .where('id', '=', holdId)
    .select(['parentageId', 'strainId'])
    .executeTakeFirstOrThrow();
  const parentage = (await parentagesOf(scope, [parentageId])).get(parentageId);
  const hybrid = parentage ? await mayBeHybrid(scope, strainId, parentage) : false;
  const about = await beginBrood(scope, {
    ...brood,
    holdId,
    parentageId,
    strainId: hybrid ? null : strainId,
    possibleHybrid: hybrid,
    spawnEarliest: hold.spawnEarliest,
    spawnLatest: hold.spawnLatest,
    onDay,
    start: outcome === 'stripped' ? 'stripped' : 'released',
    note,
    entryId,
  });
  return { onDay, about: [...aboutHold(hold), ...about], made: { brood: brood.broodId, batch: brood.batchId } };
}
