import type * as z from 'zod/mini';
import type { mergeFish } from '../../shared/lineage/contract';
import { PedigreeError } from '../../shared/lineage/pedigreeError';
import { sortPedigree } from '../../shared/lineage/sortedPedigree';
import { Refusal } from '../../shared/refusal';
import { audit } from '../db/audit';
import { newId } from '../db/newId';
import { fishRows, leaveColony, mustBeOurs, oneFish } from '../fish';
import type { Scope } from '../scope';
import { pedigreeOf } from './pedigree';

/**
 * One fish had two records. The first ends as merged: in the pedigree it stands for the other from now on; its findings,
 * lengths and photos go along; the tank and colony are those of the record that stays.
 */
export async function merge(
  scope: Scope,
  fishId: string,
  { intoId, note }: z.output<typeof mergeFish.body>,
): Promise<{ fishId: string; code: string | null }> {
  const { db, roomId, now, today } = scope;
  const from = await oneFish(scope, fishId);
  await mustBeOurs(scope, 'fish', intoId, 'intoId', 'Choose a fish');
  const [into] = await fishRows(scope, { ids: [intoId] });
  const refuse = (said: string): never => {
    throw new Refusal('invalid', said, { intoId: said });
  };
  if (!into || fishId === intoId) return refuse('Choose another record');
  if (from.exit) throw new Refusal('conflict', `${from.code ?? 'This record'} has ended already`);
  if (into.exit?.kind === 'merged') refuse('That record was merged into another itself');
  if (from.sex !== 'unknown' && into.sex !== 'unknown' && from.sex !== into.sex)
    refuse(`One is recorded as ${from.sex}, the other as ${into.sex}. Set one right first.`);
  if (from.strainId !== into.strainId) refuse('They are of different strains. Set one right first.');
  if (from.brood && !into.brood)
    refuse('This record has parents and that one has none: merge them the other way round');
  await mustHoldApart(scope, fishId, intoId);
  await leaveColony(scope, { fishId, onDay: today, entryId: null });
  await db
    .updateTable('stay')
    .set({ untilDay: today })
    .where('roomId', '=', roomId)
    .where('fishId', '=', fishId)
    .where('untilDay', 'is', null)
    .execute();
  for (const table of ['finding', 'lengthSample', 'photo'] as const)
    await db
      .updateTable(table)
      .set({ fishId: intoId })
      .where('roomId', '=', roomId)
      .where('fishId', '=', fishId)
      .execute();
  await db
    .updateTable('hold')
    .set({ holderId: intoId })
    .where('roomId', '=', roomId)
    .where('holderId', '=', fishId)
    .execute();
  await db
    .insertInto('fishExit')
    .values({
      roomId,
      id: newId(now),
      fishId,
      kind: 'merged',
      onDay: today,
      cause: null,
      mergedInto: intoId,
      note,
      entryId: null,
    })
    .execute();
  // What was merged into this one before stands for the other now, too.
  await db
    .updateTable('fishExit')
    .set({ mergedInto: intoId })
    .where('roomId', '=', roomId)
    .where('mergedInto', '=', fishId)
    .execute();
  await mustHaveNoLoop(scope);
  await audit(scope, { action: 'fish merged', about: 'fish', aboutId: fishId, change: { mergedInto: [null, intoId] } });
  return { fishId: intoId, code: into.code };
}

/** Two open holds cannot be of one mouth. */
async function mustHoldApart({ db, roomId }: Scope, a: string, b: string): Promise<void> {
  const open = await db
    .selectFrom('hold')
    .where('roomId', '=', roomId)
    .where('holderId', 'in', [a, b])
    .where('endedOn', 'is', null)
    .select('id')
    .execute();
  if (open.length < 2) return;
  const said = 'Both have an open hold. End one of them first.';
  throw new Refusal('invalid', said, { intoId: said });
}

/** A fish that is its own ancestor through the other record cannot be the same fish. */
async function mustHaveNoLoop(scope: Scope): Promise<void> {
  try {
    sortPedigree((await pedigreeOf(scope)).entries);
  } catch (error) {
    if (!(error instanceof PedigreeError) || error.reason !== 'cycle') throw error;
    const said = 'One is an ancestor of the other: they cannot be one fish';
    throw new Refusal('invalid', said, { intoId: said });
  }
}
