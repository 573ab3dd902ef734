import type { About } from '../../shared/record/contract';
import { Refusal } from '../../shared/refusal';
import { addLine } from '../broods';
import { newId } from '../db/newId';
import { endStay, leaveColony, mustBeOurs } from '../fish';
import type { KindRules } from '../record/kinds';
import type { Scope } from '../scope';

type Kinds =
  | 'waterTested'
  | 'waterChanged'
  | 'treatmentStarted'
  | 'treatmentEnded'
  | 'quarantineStarted'
  | 'seenWell'
  | 'incident';

type NewCare = {
  id?: string;
  tankId: string;
  kind: 'waterChange' | 'treatment' | 'quarantine' | 'seenWell' | 'incident';
  onDay: string;
  untilDay?: string | null;
  percent?: number;
  what?: string;
  why?: string | null;
  dose?: string | null;
  note: string | null;
  entryId: string;
};

async function addCare({ db, roomId, actorId, now }: Scope, care: NewCare): Promise<void> {
  const { id = newId(now), untilDay = null, percent = null, what = null, why = null, dose = null, ...facts } = care;
  await db
    .insertInto('tankCare')
    .values({ roomId, id, ...facts, at: now, untilDay, percent, what, why, dose, actorId, endEntryId: null })
    .execute();
}

const inTank = (tankId: string): About[] => [{ thing: 'tank', id: tankId }];

/** What Record can say about water and care. */
export const waterKinds: Pick<KindRules, Kinds> = {
  waterTested: {
    async store(scope, { kind: _kind, asRead, ...test }, { entryId, madeAt }) {
      const { db, roomId, actorId, now } = scope;
      await mustBeOurs(scope, 'tank', test.tankId, 'tankId', 'Choose a tank');
      await db
        .insertInto('waterReading')
        .values({
          roomId,
          id: newId(now),
          ...test,
          at: madeAt,
          source: 'test',
          asRead: JSON.stringify(asRead),
          actorId,
          entryId,
        })
        .execute();
      return { onDay: test.onDay, about: inTank(test.tankId) };
    },
    say: ({ tankId, celsius, ph }, codes) =>
      `Water test, ${codes(tankId)}${ph === null ? '' : `, pH ${ph}`}${celsius === null ? '' : `, ${celsius} °C`}`,
  },
  waterChanged: {
    async store(scope, { tankId, onDay, percent, note }, { entryId }) {
      await mustBeOurs(scope, 'tank', tankId, 'tankId', 'Choose a tank');
      await addCare(scope, { tankId, kind: 'waterChange', onDay, percent, note, entryId });
      return { onDay, about: inTank(tankId) };
    },
    say: ({ tankId, percent }, codes) => `Water change, ${codes(tankId)}, ${percent} %`,
  },
  treatmentStarted: {
    async store(scope, { careId, tankId, onDay, what, why, dose, untilDay, note }, { entryId }) {
      await mustBeOurs(scope, 'tank', tankId, 'tankId', 'Choose a tank');
      if (untilDay && untilDay < onDay)
        throw new Refusal('invalid', 'It cannot end before it starts', { untilDay: 'Not before the first day' });
      await addCare(scope, { id: careId, tankId, kind: 'treatment', onDay, untilDay, what, why, dose, note, entryId });
      return { onDay, about: inTank(tankId) };
    },
    say: ({ tankId, what, why }, codes) => `Treatment, ${codes(tankId)}: ${what}, ${why}`,
  },
  treatmentEnded: {
    async store(scope, { careId, onDay }, { entryId }) {
      const { db, roomId } = scope;
      const care = await db
        .selectFrom('tankCare')
        .where('roomId', '=', roomId)
        .where('id', '=', careId)
        .select(['tankId', 'onDay', 'endEntryId', 'kind'])
        .executeTakeFirst();
      if (!care) throw new Refusal('invalid', 'That treatment was not found', { careId: 'Choose a treatment' });
      if (care.endEntryId) throw new Refusal('conflict', 'It has ended already');
      if (onDay < care.onDay)
        throw new Refusal('invalid', 'It cannot end before it starts', { onDay: 'Not before the first day' });
      await db
        .updateTable('tankCare')
        .set({ untilDay: onDay, endEntryId: entryId })
        .where('roomId', '=', roomId)
        .where('id', '=', careId)
        .execute();
      return { onDay, about: inTank(care.tankId) };
    },
    say: () => 'Treatment or quarantine ended',
  },
  quarantineStarted: {
    async store(scope, { careId, tankId, onDay, untilDay, why, note }, { entryId }) {
      await mustBeOurs(scope, 'tank', tankId, 'tankId', 'Choose a tank');
      if (untilDay && untilDay < onDay)
        throw new Refusal('invalid', 'It cannot end before it starts', { untilDay: 'Not before the first day' });
      await addCare(scope, { id: careId, tankId, kind: 'quarantine', onDay, untilDay, why, note, entryId });
      return { onDay, about: inTank(tankId) };
    },
    say: ({ tankId, untilDay }, codes) => `Quarantine, ${codes(tankId)}${untilDay ? ` until ${untilDay}` : ''}`,
  },
  seenWell: {
    async store(scope, { tankId, onDay, note }, { entryId }) {
      await mustBeOurs(scope, 'tank', tankId, 'tankId', 'Choose a tank');
      await addCare(scope, { tankId, kind: 'seenWell', onDay, note, entryId });
      return { onDay, about: inTank(tankId) };
    },
    say: ({ tankId }, codes) => `Seen well, ${codes(tankId)}`,
  },
  incident: {
    async store(scope, { tankIds, onDay, what, losses, fishDied, note }, { entryId }) {
      const { db, roomId, now } = scope;
      for (const [i, tankId] of tankIds.entries()) {
        await mustBeOurs(scope, 'tank', tankId, `tankIds.${i}`, 'Choose a tank');
        await addCare(scope, { tankId, kind: 'incident', onDay, what, note, entryId });
      }
      for (const [i, { batchId, heads, cause }] of losses.entries()) {
        await mustBeOurs(scope, 'batch', batchId, `losses.${i}.batchId`, 'Choose a batch');
        await addLine(scope, { batchId, kind: 'loss', onDay, heads, cause, note: what, entryId });
      }
      for (const [i, fishId] of fishDied.entries()) {
        await mustBeOurs(scope, 'fish', fishId, `fishDied.${i}`, 'Choose a fish');
        await db
          .insertInto('fishExit')
          .values({ roomId, id: newId(now), fishId, kind: 'died', onDay, cause: what, mergedInto: null, note, entryId })
          .execute();
        await leaveColony(scope, { fishId, onDay, entryId });
        await endStay(scope, 'fishId', fishId, onDay, entryId);
      }
      return {
        onDay,
        about: [
          ...tankIds.flatMap(inTank),
          ...losses.map(({ batchId }): About => ({ thing: 'batch', id: batchId })),
          ...fishDied.map((id): About => ({ thing: 'fish', id })),
        ],
      };
    },
    say: ({ what, tankIds }, codes) => `${what}: ${tankIds.map(codes).join(', ')}`,
  },
};
