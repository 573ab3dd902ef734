import type * as z from 'zod/mini';
import type { changeParentage, previewParentage, readParentage } from '../../shared/lineage/contract';
import { notFound, Refusal } from '../../shared/refusal';
import { audit } from '../db/audit';
import { fishRows } from '../fish';
import type { Scope } from '../scope';
import { mustNotLoop } from './acyclic';
import { contradictionsOf } from './contradictions';
import { differences, figuresOf } from './differences';
import { keepParentage, parentagesOf } from './parentage';

type Change = z.output<typeof changeParentage.body>;
type Animal = {
  thing: 'fish' | 'brood' | 'hold';
  name: string | null;
  /** The parentage that a change here goes to; null for a fish without one of its own. */
  rootId: string | null;
  /** What is known until then: its brood's. */
  inherited: string | null;
};

async function animalOf({ db, roomId }: Scope, id: string): Promise<Animal> {
  const fish = await db
    .selectFrom('fish')
    .leftJoin('brood', (join) => join.onRef('brood.roomId', '=', 'fish.roomId').onRef('brood.id', '=', 'fish.broodId'))
    .where('fish.roomId', '=', roomId)
    .where('fish.id', '=', id)
    .select(['fish.code', 'fish.parentageId', 'brood.parentageId as inherited'])
    .executeTakeFirst();
  if (fish) return { thing: 'fish', name: fish.code, rootId: fish.parentageId, inherited: fish.inherited };
  const brood = await db
    .selectFrom('brood')
    .where('roomId', '=', roomId)
    .where('id', '=', id)
    .select(['code', 'parentageId'])
    .executeTakeFirst();
  if (brood) return { thing: 'brood', name: brood.code, rootId: brood.parentageId, inherited: null };
  const hold = await db
    .selectFrom('hold')
    .leftJoin('fish', (join) => join.onRef('fish.roomId', '=', 'hold.roomId').onRef('fish.id', '=', 'hold.holderId'))
    .where('hold.roomId', '=', roomId)
    .where('hold.id', '=', id)
    .select(['fish.code', 'hold.parentageId'])
    .executeTakeFirst();
  if (hold) return { thing: 'hold', name: hold.code, rootId: hold.parentageId, inherited: null };
  throw notFound('That animal');
}

export async function parentageOf(scope: Scope, id: string): Promise<z.input<typeof readParentage.output>> {
  const { thing, name, rootId, inherited } = await animalOf(scope, id);
  const shown = rootId ?? inherited;
  const told = shown ? (await parentagesOf(scope, [shown])).get(shown) : undefined;
  const turns = await scope.db
    .selectFrom('parentage')
    .innerJoin('account', 'account.id', 'parentage.madeBy')
    .where('parentage.roomId', '=', scope.roomId)
    .where('parentage.rootId', '=', shown ?? '')
    .select(['parentage.turn', 'parentage.basis', 'parentage.madeAt as at', 'account.name as by'])
    .orderBy('parentage.turn', 'desc')
    .execute();
  return {
    thing,
    name,
    turn: rootId ? (told?.turn ?? 0) : 0,
    parentage: told ?? { rootId: id, turn: 0, paternity: 'single', sires: [], dams: [], basis: null },
    spawn: await spawnOf(scope, id),
    turns,
  };
}

/** The spawn behind a hold, a brood or a fish. */
async function spawnOf({ db, roomId }: Scope, id: string) {
  const found = await db
    .selectFrom('hold')
    .innerJoin('tank', (join) => join.onRef('tank.roomId', '=', 'hold.roomId').onRef('tank.id', '=', 'hold.tankId'))
    .leftJoin('brood', (join) => join.onRef('brood.roomId', '=', 'hold.roomId').onRef('brood.holdId', '=', 'hold.id'))
    .where('hold.roomId', '=', roomId)
    .where(({ or, eb, selectFrom }) =>
      or([
        eb('hold.id', '=', id),
        eb('brood.id', '=', id),
        eb('brood.id', '=', selectFrom('fish').where('roomId', '=', roomId).where('id', '=', id).select('broodId')),
      ]),
    )
    .select(['tank.id', 'tank.code', 'hold.spawnEarliest', 'hold.spawnLatest'])
    .executeTakeFirst();
  if (!found) return null;
  const { id: tankId, code, spawnEarliest, spawnLatest } = found;
  return { tank: { id: tankId, code }, from: spawnEarliest, until: spawnLatest };
}

export async function changeOf(scope: Scope, id: string, change: Change) {
  await write(scope, id, change);
  return { ok: true } as const;
}

/** The change itself: the preview makes it too, and takes it back, so that the two cannot differ. */
async function write(scope: Scope, id: string, { turn, parentage }: Change): Promise<void> {
  const { db, roomId } = scope;
  const animal = await animalOf(scope, id);
  const { rootId, thing } = animal;
  const seen = await parentageOf(scope, id);
  if (seen.turn !== turn)
    throw new Refusal('conflict', 'Someone changed these parents meanwhile', {}, { current: seen });
  await sexesMustFit(scope, parentage);
  const kept = await keepParentage(scope, parentage, { entryId: null, ...(rootId ? { rootId } : {}) });
  if (!rootId)
    await db.updateTable('fish').set({ parentageId: kept }).where('roomId', '=', roomId).where('id', '=', id).execute();
  await mustNotLoop(scope, 'parentage.sires');
  await audit(scope, {
    action: 'parentage changed',
    about: thing,
    aboutId: id,
    change: { turn: [turn, turn + 1], sires: [seen.parentage.sires, parentage.sires] },
  });
}

async function sexesMustFit(scope: Scope, draft: Change['parentage']): Promise<void> {
  for (const [side, wrong, word] of [
    ['sires', 'female', 'father'],
    ['dams', 'male', 'mother'],
  ] as const) {
    const ids = draft[side].flatMap(({ fishId }) => fishId ?? []);
    if (ids.length === 0) continue;
    const found = (await fishRows(scope, { ids, foreign: true })).find((fish) => fish.sex === wrong && fish.sexCertain);
    if (!found) continue;
    const at = draft[side].findIndex(({ fishId }) => fishId === found.id);
    throw new Refusal('invalid', `${found.code ?? 'This fish'} is recorded as a ${wrong}`, {
      [`parentage.${side}.${at}.fishId`]: `A ${wrong} cannot be the ${word}. Correct its sex first`,
    });
  }
}

class TakenBack extends Error {}

export async function previewOf(
  scope: Scope,
  id: string,
  change: Change,
): Promise<z.input<typeof previewParentage.output>> {
  let found: z.input<typeof previewParentage.output> | undefined;
  try {
    await scope.db.transaction().execute(async (db) => {
      const inside = { ...scope, db };
      const [before, doubted] = [await figuresOf(inside), await contradictionsOf(inside)];
      await write(inside, id, change);
      const changes = differences(before, await figuresOf(inside));
      const known = new Set(doubted.map(({ says }) => says));
      const doubts = (await contradictionsOf(inside)).map(({ says }) => says).filter((says) => !known.has(says));
      found = { changes, doubts, sheets: await sheetsOf(inside, new Set([id, ...changes.map((one) => one.id)])) };
      throw new TakenBack();
    });
  } catch (error) {
    if (!(error instanceof TakenBack)) throw error;
  }
  if (!found) throw new Error('The preview was not worked out');
  return found;
}

/** Sheets in force of any of these animals: what they say is no longer so. */
async function sheetsOf({ db, roomId }: Scope, ids: Set<string>) {
  const rows = await db
    .selectFrom('sheet')
    .where('roomId', '=', roomId)
    .where('replacedAt', 'is', null)
    .where('withdrawnAt', 'is', null)
    .select(['id', 'fishId', 'broodId', 'number', 'issuedOn'])
    .orderBy('number')
    .execute();
  return rows
    .filter(({ fishId, broodId }) => ids.has(fishId ?? broodId ?? ''))
    .map(({ id, number, issuedOn }) => ({ id, number: `${issuedOn.slice(0, 4)}-${String(number).padStart(4, '0')}` }));
}
