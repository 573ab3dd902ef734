import { UNDO_MINUTES } from '../../shared/record/contract';
import { EntryContent } from '../../shared/record/kinds';
import { Refusal } from '../../shared/refusal';
import { may } from '../../shared/roles';
import { audit } from '../db/audit';
import { newId } from '../db/newId';
import type { Scope } from '../scope';
import { ruleOf } from './kinds';

/** Rows that an entry may have made, those that refer to others first. Foreign keys refuse when something was built on one. */
const MADE = [
  'photo',
  'lengthSample',
  'holdCheck',
  'stageCount',
  'reservation',
  'waterReading',
  'tankCare',
  'finding',
  'fishExit',
  'colonyMember',
  'stay',
  'fish',
  'batchSource',
  'batch',
  'brood',
  'hold',
  'parentage',
  'colony',
] as const;

/** What an entry may have ended: the row goes on as before. */
const ENDED = ['colonyMember', 'stay', 'tankCare'] as const;

/**
 * Takes an entry back. The rows it made go, the intervals it ended go on, ledger lines are reversed (the ledger is never
 * edited), and the entry itself stays in the history, marked as undone. `whenever`: a whole import has no such minutes.
 */
export async function undo(scope: Scope, entryId: string, { whenever = false } = {}): Promise<void> {
  const { db, roomId, actorId, now } = scope;
  const entry = await db
    .selectFrom('entry')
    .where('roomId', '=', roomId)
    .where('id', '=', entryId)
    .selectAll()
    .executeTakeFirst();
  if (!entry) throw new Refusal('not-found', 'That entry was not found');
  if (entry.undoneAt) return;
  if (entry.actorId !== actorId && !may(scope.role, 'entry:correct'))
    throw new Refusal('forbidden', 'Only a keeper or owner can undo another person’s entry');
  if (!whenever && Date.parse(now) > Date.parse(entry.receivedAt) + UNDO_MINUTES * 60_000) {
    throw new Refusal('conflict', `After ${UNDO_MINUTES} minutes an entry is corrected by another, not undone`);
  }
  // Marked first: only lines of an undone entry may leave the ledger, and only with the batch that it made.
  await db
    .updateTable('entry')
    .set({ undoneAt: now, undoneBy: actorId })
    .where('roomId', '=', roomId)
    .where('id', '=', entryId)
    .execute();
  const content = EntryContent.parse(JSON.parse(entry.content));
  await ruleOf(content.kind).undo?.(scope, content);
  await reverseHeads(scope, entryId);
  await reopenHold(scope, entryId);
  for (const table of ENDED) {
    await db
      .updateTable(table)
      .set({ untilDay: null, endEntryId: null })
      .where('roomId', '=', roomId)
      .where('endEntryId', '=', entryId)
      .execute();
  }
  try {
    for (const table of MADE)
      await db.deleteFrom(table).where('roomId', '=', roomId).where('entryId', '=', entryId).execute();
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === 'SQLITE_CONSTRAINT_FOREIGNKEY') {
      throw new Refusal(
        'conflict',
        'Something was recorded on top of this. Undo that first, or correct it by another entry.',
      );
    }
    throw error;
  }
  await audit(scope, { action: 'entry undone', about: entry.kind, aboutId: entryId });
}

async function reverseHeads({ db, roomId, actorId, now }: Scope, entryId: string): Promise<void> {
  const ownBatches = db.selectFrom('batch').where('roomId', '=', roomId).where('entryId', '=', entryId).select('id');
  await db
    .deleteFrom('headEntry')
    .where('roomId', '=', roomId)
    .where('entryId', '=', entryId)
    .where('batchId', 'in', ownBatches)
    .execute();
  const lines = await db
    .selectFrom('headEntry')
    .where('roomId', '=', roomId)
    .where('entryId', '=', entryId)
    .where('reverses', 'is', null)
    .selectAll()
    .execute();
  for (const line of lines) {
    await db
      .insertInto('headEntry')
      .values({ ...line, id: newId(now), at: now, reverses: line.id, actorId, pairId: null, purchaseLineId: null })
      .execute();
  }
}

async function reopenHold({ db, roomId }: Scope, entryId: string): Promise<void> {
  await db
    .updateTable('hold')
    .set({ outcome: null, endedOn: null, endEntryId: null })
    .where('roomId', '=', roomId)
    .where('endEntryId', '=', entryId)
    .execute();
}
