import type { StageNumbers } from '../../shared/holds/entries';
import type { About } from '../../shared/record/contract';
import { Refusal } from '../../shared/refusal';
import { isUniqueViolation } from '../db/constraint';
import { newId } from '../db/newId';
import { mustBeOurs, startStay } from '../fish';
import type { Scope } from '../scope';
import { addLine } from './ledger';

export type BroodBeginning = {
  broodId: string;
  batchId: string;
  code: string;
  holdId: string | null;
  strainId: string | null;
  parentageId: string;
  possibleHybrid: boolean;
  spawnEarliest: string;
  spawnLatest: string;
  onDay: string;
  start: 'stripped' | 'released' | 'found' | 'guarded' | 'acquired';
  tankId: string;
  numbers: StageNumbers;
  opening: number | null;
  note: string | null;
  entryId: string;
};

/** A brood with its first batch in a tank, what was counted, and the head count opened if the fry swim free. */
export async function beginBrood(scope: Scope, brood: BroodBeginning): Promise<About[]> {
  const { db, roomId, now } = scope;
  const { broodId, batchId, code, onDay, tankId, numbers, opening, note, entryId } = brood;
  await mustBeOurs(scope, 'tank', tankId, 'brood.tankId', 'Choose a tank');
  const { holdId, strainId, parentageId, possibleHybrid, spawnEarliest, spawnLatest, start } = brood;
  if (onDay < spawnEarliest)
    throw new Refusal('invalid', 'That is before the spawn', { onDay: `Not before ${spawnEarliest}` });
  await keepBroodCode(code, 'brood.code', () =>
    db
      .insertInto('brood')
      .values({
        roomId,
        id: broodId,
        code,
        holdId,
        strainId,
        parentageId,
        possibleHybrid: possibleHybrid ? 1 : 0,
        spawnEarliest,
        spawnLatest,
        startedOn: onDay,
        start,
        note,
        entryId,
        createdAt: now,
      })
      .execute(),
  );
  await db
    .insertInto('batch')
    .values({ roomId, id: batchId, startedOn: onDay, note: null, entryId, createdAt: now })
    .execute();
  await db
    .insertInto('batchSource')
    .values({
      roomId,
      id: newId(now),
      batchId,
      broodId,
      heads: opening ?? numbers.total ?? sumOf(numbers),
      fromDay: onDay,
      entryId,
    })
    .execute();
  await startStay(scope, { column: 'batchId', id: batchId, tankId, onDay, entryId });
  if (Object.values(numbers).some((number) => number !== null))
    await addStageCount(scope, { broodId, onDay, numbers, note: null, entryId });
  if (opening !== null && opening > 0)
    await addLine(scope, { batchId, kind: 'opening', onDay, heads: opening, entryId });
  return [
    { thing: 'brood', id: broodId },
    { thing: 'batch', id: batchId },
    { thing: 'tank', id: tankId },
  ];
}

const sumOf = ({ eggs, wrigglers, freeSwimming }: StageNumbers): number =>
  (eggs ?? 0) + (wrigglers ?? 0) + (freeSwimming ?? 0);

export async function addStageCount(
  { db, roomId, actorId, now }: Scope,
  count: { broodId: string; onDay: string; numbers: StageNumbers; note: string | null; entryId: string },
): Promise<void> {
  const { numbers, ...facts } = count;
  await db
    .insertInto('stageCount')
    .values({ roomId, id: newId(now), ...facts, ...numbers, actorId })
    .execute();
}

export async function keepBroodCode<T>(code: string, field: string, write: () => Promise<T>): Promise<T> {
  try {
    return await write();
  } catch (error) {
    if (isUniqueViolation(error, 'brood.code'))
      throw new Refusal('conflict', `Another brood has the code ${code}`, { [field]: 'Taken: choose another code' });
    if (isUniqueViolation(error, 'brood.holdId')) throw new Refusal('conflict', 'This hold has a brood already');
    throw error;
  }
}
