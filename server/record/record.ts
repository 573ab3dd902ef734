import { createHash } from 'node:crypto';
import type { EntryDraft, EntryLine } from '../../shared/record/contract';
import { UNDO_MINUTES } from '../../shared/record/contract';
import { EntryContent } from '../../shared/record/kinds';
import { Refusal } from '../../shared/refusal';
import { mustBeAllowed, type Scope } from '../scope';
import { codesOf } from './codes';
import { type Picture, ruleOf } from './kinds';

const hashOf = (content: unknown) => createHash('sha256').update(JSON.stringify(content)).digest('hex');

/**
 * Stores an entry once, inside the caller's transaction. The same id with the same content is the same entry, sent again;
 * with other content it is a conflict, and nothing is overwritten.
 */
export async function keepEntry(
  scope: Scope,
  draft: EntryDraft,
  more: { picture?: Picture } = {},
): Promise<{ isNew: boolean }> {
  const { db, roomId, actorId, now } = scope;
  const contentHash = hashOf(draft.content);
  const known = await db
    .selectFrom('entry')
    .where('roomId', '=', roomId)
    .where('id', '=', draft.id)
    .select(['contentHash', 'actorId'])
    .executeTakeFirst();
  if (known) {
    if (known.contentHash === contentHash && known.actorId === actorId) return { isNew: false };
    throw new Refusal(
      'conflict',
      'Another entry was stored under this number',
      {},
      { current: await lineOf(scope, draft.id) },
    );
  }
  await mustFollow(scope, draft.dependsOn);
  const rule = ruleOf(draft.content.kind);
  if (rule.needs) mustBeAllowed(scope, rule.needs);
  if (Date.parse(draft.madeAt) > Date.parse(now) + 300_000)
    throw new Refusal('invalid', 'The clock of this device is ahead', { madeAt: 'Set the device’s clock' });
  // The envelope first, so that every row made below can name it; its day and subjects are filled in after.
  await db
    .insertInto('entry')
    .values({
      roomId,
      id: draft.id,
      kind: draft.content.kind,
      content: JSON.stringify(draft.content),
      contentHash,
      actorId,
      madeAt: draft.madeAt,
      receivedAt: now,
      onDay: scope.today,
      about: '{}',
      undoneAt: null,
      undoneBy: null,
    })
    .execute();
  const stored = await rule.store(scope, draft.content, { entryId: draft.id, madeAt: draft.madeAt, ...more });
  if (stored.onDay > scope.today)
    throw new Refusal('invalid', 'That day is still to come', { onDay: 'Choose today or an earlier day' });
  await db
    .updateTable('entry')
    .set({ onDay: stored.onDay, about: JSON.stringify({ about: stored.about, made: stored.made ?? {} }) })
    .where('roomId', '=', roomId)
    .where('id', '=', draft.id)
    .execute();
  if (stored.about.length > 0) {
    await db
      .insertInto('entryAbout')
      .values(stored.about.map(({ thing, id }) => ({ roomId, entryId: draft.id, thing, thingId: id })))
      .onConflict((clash) => clash.doNothing())
      .execute();
  }
  return { isNew: true };
}

async function mustFollow({ db, roomId }: Scope, ids: string[]): Promise<void> {
  if (ids.length === 0) return;
  const found = await db
    .selectFrom('entry')
    .where('roomId', '=', roomId)
    .where('id', 'in', ids)
    .select(['id', 'undoneAt'])
    .execute();
  const missing = ids.find((id) => !found.some((entry) => entry.id === id && entry.undoneAt === null));
  if (missing)
    throw new Refusal('conflict', 'An earlier entry that this one builds on is not there', { dependsOn: missing });
}

export async function lineOf(scope: Scope, entryId: string): Promise<EntryLine> {
  const [entry] = await linesOf(scope, [entryId]);
  if (!entry) throw new Refusal('not-found', 'That entry was not found');
  return entry;
}

type Filter = {
  thing?: 'tank' | 'colony' | 'fish' | 'hold' | 'brood' | 'batch' | 'strain' | undefined;
  thingId?: string | undefined;
  limit?: number | undefined;
  before?: string | undefined;
};

/** Newest first; of one thing, or of the whole fishroom. */
export async function entriesOf(scope: Scope, filter: Filter): Promise<EntryLine[]> {
  const { thing, thingId, before, limit = 100 } = filter;
  let query = scope.db.selectFrom('entry').where('entry.roomId', '=', scope.roomId).select('entry.id');
  if (thing && thingId) {
    query = query
      .innerJoin('entryAbout', (join) =>
        join.onRef('entryAbout.roomId', '=', 'entry.roomId').onRef('entryAbout.entryId', '=', 'entry.id'),
      )
      .where('entryAbout.thing', '=', thing)
      .where('entryAbout.thingId', '=', thingId);
  }
  if (before) query = query.where('entry.receivedAt', '<', before);
  const rows = await query.orderBy('entry.onDay', 'desc').orderBy('entry.id', 'desc').limit(limit).execute();
  return linesOf(
    scope,
    rows.map(({ id }) => id),
  );
}

async function linesOf(scope: Scope, ids: string[]): Promise<EntryLine[]> {
  if (ids.length === 0) return [];
  const rows = await scope.db
    .selectFrom('entry')
    .innerJoin('account as actor', 'actor.id', 'entry.actorId')
    .leftJoin('account as undoer', 'undoer.id', 'entry.undoneBy')
    .where('entry.roomId', '=', scope.roomId)
    .where('entry.id', 'in', ids)
    .select([
      'entry.id',
      'entry.kind',
      'entry.content',
      'entry.onDay',
      'entry.madeAt',
      'entry.receivedAt',
      'entry.about',
      'entry.actorId',
      'entry.undoneAt',
      'actor.name as actorName',
      'undoer.name as undoerName',
    ])
    .orderBy('entry.onDay', 'desc')
    .orderBy('entry.id', 'desc')
    .execute();
  const abouts = rows.map(
    (row): Pick<EntryLine, 'about' | 'made'> => ({ about: [], made: {}, ...JSON.parse(row.about) }),
  );
  const codes = await codesOf(
    scope,
    abouts.flatMap(({ about }) => about),
  );
  return rows.map((row, i) => {
    const { about = [], made = {} } = abouts[i] ?? {};
    const content = EntryContent.safeParse(JSON.parse(row.content));
    return {
      id: row.id,
      kind: row.kind,
      onDay: row.onDay,
      madeAt: row.madeAt,
      receivedAt: row.receivedAt,
      by: { id: row.actorId, name: row.actorName },
      said: content.success ? ruleOf(content.data.kind).say(content.data, codes) : row.kind,
      about,
      made,
      undone: row.undoneAt ? { at: row.undoneAt, by: row.undoerName ?? '' } : null,
      undoUntil: new Date(Date.parse(row.receivedAt) + UNDO_MINUTES * 60_000).toISOString(),
    };
  });
}
