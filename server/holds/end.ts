import { OUTCOME_WORDS } from '../../shared/holds/entries';
import type { ContentOf } from '../../shared/record/kinds';
import { Refusal } from '../../shared/refusal';
import { beginBrood } from '../broods';
import { newId } from '../db/newId';
import { addFinding, endStay, leaveColony } from '../fish';
import { parentagesOf } from '../lineage';
import type { Scope } from '../scope';
import { mayBeHybrid } from './holds';
import { aboutHold, openHold } from './openHold';

export async function endHold(scope: Scope, content: ContentOf<'holdEnded'>, { entryId }: { entryId: string }) {
  const { db, roomId } = scope;
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
  if (outcome === 'diedHolding' && hold.holder) await diedHolding(scope, hold.holder.id, { onDay, note, entryId });
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

/** She left the fishroom, her colony and her tank with the hold. */
async function diedHolding(
  scope: Scope,
  fishId: string,
  { onDay, note, entryId }: { onDay: string; note: string | null; entryId: string },
): Promise<void> {
  const { db, roomId, now } = scope;
  await db
    .insertInto('fishExit')
    .values({
      roomId,
      id: newId(now),
      fishId,
      kind: 'died',
      onDay,
      cause: 'died holding',
      mergedInto: null,
      note,
      entryId,
    })
    .execute();
  await leaveColony(scope, { fishId, onDay, entryId });
  await endStay(scope, 'fishId', fishId, onDay, entryId);
}
