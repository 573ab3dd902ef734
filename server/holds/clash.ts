import type * as z from 'zod/mini';
import { dayWords } from '../../shared/days';
import type { HoldClash } from '../../shared/holds/contract';
import { Refusal } from '../../shared/refusal';
import { parentagesOf } from '../lineage';
import type { Scope } from '../scope';
import { oneHold } from './holds';

/** Two people saw the same mouth: the record that is there already is shown beside the new one. */
export async function alreadyHolding(scope: Scope, holderId: string): Promise<Refusal> {
  const open = await scope.db
    .selectFrom('hold')
    .where('roomId', '=', scope.roomId)
    .where('holderId', '=', holderId)
    .where('endedOn', 'is', null)
    .select('id')
    .executeTakeFirstOrThrow();
  const clash = await clashOf(scope, open.id);
  return new Refusal(
    'conflict',
    `She is recorded as holding already, first seen ${dayWords(clash.hold.firstSeenOn, scope.today)}`,
    { holderId: 'Already holding' },
    { current: clash },
  );
}

/** The record that is there already: what it says, and who wrote it when. */
export async function clashOf(scope: Scope, holdId: string): Promise<z.input<typeof HoldClash>> {
  const { db, roomId } = scope;
  const hold = await oneHold(scope, holdId);
  const row = await db
    .selectFrom('hold')
    .leftJoin('entry', (join) =>
      join
        .onRef('entry.roomId', '=', 'hold.roomId')
        .on(({ eb, fn, ref }) => eb('entry.id', '=', fn.coalesce(ref('hold.endEntryId'), ref('hold.entryId')))),
    )
    .leftJoin('account', 'account.id', 'entry.actorId')
    .where('hold.roomId', '=', roomId)
    .where('hold.id', '=', holdId)
    .select(['hold.parentageId', 'entry.id as entryId', 'entry.madeAt', 'account.name as by'])
    .executeTakeFirstOrThrow();
  const parentage = (await parentagesOf(scope, [row.parentageId])).get(row.parentageId);
  return {
    hold,
    sires: parentage?.sires ?? [],
    entryId: row.entryId,
    by: row.by,
    madeAt: row.madeAt,
  };
}
