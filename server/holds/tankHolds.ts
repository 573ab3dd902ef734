import type { EntryKind } from '../../shared/record/contract';
import type { Scope } from '../scope';

/** The holds of some fish, oldest first. */
export async function holdsOfFish({ db, roomId }: Scope, fishIds: string[]) {
  if (fishIds.length === 0) return [];
  return db
    .selectFrom('hold')
    .where('roomId', '=', roomId)
    .where('holderId', 'in', fishIds)
    .select(['id', 'holderId', 'spawnEarliest', 'spawnLatest', 'endedOn'])
    .orderBy('spawnLatest')
    .orderBy('id')
    .execute();
}

/** Kinds of entry that nobody makes without having looked at every mouth of the tank. */
const LOOKS: EntryKind[] = ['seenWell', 'holdCheck', 'holdingSeen', 'spawnSeen', 'holdEnded'];

/** The last day before today on which someone looked into a tank: who was not recorded as holding then was not holding. */
export async function lookedInto({ db, roomId, today }: Scope, tankId: string): Promise<string | null> {
  const row = await db
    .selectFrom('entry')
    .innerJoin('entryAbout', (join) =>
      join.onRef('entryAbout.roomId', '=', 'entry.roomId').onRef('entryAbout.entryId', '=', 'entry.id'),
    )
    .where('entry.roomId', '=', roomId)
    .where('entryAbout.thing', '=', 'tank')
    .where('entryAbout.thingId', '=', tankId)
    .where('entry.kind', 'in', LOOKS)
    .where('entry.undoneAt', 'is', null)
    .where('entry.onDay', '<', today)
    .select(({ fn }) => fn.max('entry.onDay').as('onDay'))
    .executeTakeFirst();
  return row?.onDay ?? null;
}
