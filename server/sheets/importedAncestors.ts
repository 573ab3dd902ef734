import { isDay } from '../../shared/days';
import { type AncestryEntry, splitAnimalId } from '../../shared/sheets/ancestry';
import { newId } from '../db/newId';
import { addFinding } from '../fish';
import type { Scope } from '../scope';
import type { ImportPlan } from './importPlan';
import type { SheetRead } from './readSource';

export type Taking = { importId: string; plan: ImportPlan; read: SheetRead };

/** Ancestors that are new here get a record without a life; what this sheet knows better is told anew. */
export async function keepAncestors(scope: Scope, { importId, plan, read }: Taking): Promise<void> {
  const { subject } = read.content;
  for (const { entry, fate, fishId } of plan.animals) {
    if (entry.kind === 'brood') continue;
    if (fate === 'corrected' && fishId) await tellAnew(scope, { importId, entry, fishId });
    if (fate !== 'new' || entry.id === subject.id) continue;
    await keepAnimal(scope, { importId, entry });
  }
}

async function tellAnew(
  { db, roomId }: Scope,
  { importId, entry, fishId }: { importId: string; entry: AncestryEntry; fishId: string },
): Promise<void> {
  await db
    .updateTable('toldFish')
    .set({ entry: JSON.stringify(entry), importedSheetId: importId })
    .where('roomId', '=', roomId)
    .where('fishId', '=', fishId)
    // A fish that lives here stays with the sheet that it came with; only what is told of it changes.
    .where('here', '=', 0)
    .execute();
  await db
    .updateTable('toldFish')
    .set({ entry: JSON.stringify(entry) })
    .where('roomId', '=', roomId)
    .where('fishId', '=', fishId)
    .where('here', '=', 1)
    .execute();
}

export async function keepAnimal(
  scope: Scope,
  { importId, entry }: { importId: string; entry: AncestryEntry },
): Promise<string> {
  const { db, roomId, now } = scope;
  const id = newId(now);
  await db
    .insertInto('fish')
    .values({
      roomId,
      id,
      code: null,
      strainId: null,
      origin: 'imported',
      lotId: null,
      batchId: null,
      broodId: null,
      parentageId: null,
      bornOn: entry.born,
      arrivedOn: null,
      keptAs: 'other',
      note: null,
      entryId: null,
      createdAt: now,
    })
    .execute();
  await tell(scope, { importId, entry, fishId: id, here: 0 });
  await nameFish(scope, { importId, name: entry.id, fishId: id });
  if (entry.sex !== 'unsexed')
    await addFinding(scope, {
      fishId: id,
      kind: 'sex',
      onDay: entry.born && isDay(entry.born) ? entry.born : scope.today,
      value: entry.sex,
      how: 'told',
      entryId: null,
    });
  return id;
}

export async function tell(
  { db, roomId }: Scope,
  { importId, entry, fishId, here }: { importId: string; entry: AncestryEntry; fishId: string; here: 0 | 1 },
): Promise<void> {
  await db
    .insertInto('toldFish')
    .values({ roomId, fishId, importedSheetId: importId, here, entry: JSON.stringify(entry) })
    .execute();
}

async function nameFish(
  { db, roomId }: Scope,
  { importId, name, fishId }: { importId: string; name: string; fishId: string },
): Promise<void> {
  const parts = splitAnimalId(name);
  if (!parts) return;
  await db
    .insertInto('foreignFish')
    .values({ roomId, issuer: parts.roomId, foreignId: parts.localId, fishId, importedSheetId: importId })
    .execute();
}
