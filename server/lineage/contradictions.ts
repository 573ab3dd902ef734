import type { FishRow } from '../../shared/fish/contract';
import type { ParentageTold } from '../../shared/holds/contract';
import type { Contradiction } from '../../shared/lineage/contract';
import { PedigreeError } from '../../shared/lineage/pedigreeError';
import { sortPedigree } from '../../shared/lineage/sortedPedigree';
import { fishRows } from '../fish';
import type { Scope } from '../scope';
import { presenceIn } from '../tanks';
import { namesIn } from './acyclic';
import { parentagesOf } from './parentage';
import { pedigreeOf } from './pedigree';

/** Something with parents of its own, and the days between which it was spawned. */
type Child = {
  thing: Contradiction['thing'];
  id: string;
  name: string;
  rootId: string;
  from: string | null;
  until: string | null;
  tankId: string | null;
};

/** What cannot all be true. Each is said once, where the parents are set: at the brood rather than at each of its fry. */
export async function contradictionsOf(scope: Scope): Promise<Contradiction[]> {
  const parentages = await parentagesOf(scope);
  const fish = new Map((await fishRows(scope, { foreign: true })).map((one) => [one.id, one]));
  const found: Contradiction[] = [];
  for (const child of await children(scope)) {
    const told = parentages.get(child.rootId);
    if (told) found.push(...(await ofChild(scope, { child, told, fish })));
  }
  return [...found, ...(await loops(scope))];
}

type Family = { child: Child; told: ParentageTold; fish: Map<string, FishRow> };

async function ofChild(scope: Scope, { child, told, fish }: Family): Promise<Contradiction[]> {
  const there =
    child.tankId && child.from && child.until
      ? new Set((await presenceIn(scope, child.tankId, child.from, child.until)).map(({ fishId }) => fishId))
      : null;
  return (['sires', 'dams'] as const).flatMap((side) =>
    told[side].flatMap(({ fishId }) => {
      const parent = fishId ? fish.get(fishId) : undefined;
      if (!parent) return [];
      return wrongOf({ child, parent, side, there }).map(([kind, says]) => ({
        kind,
        thing: child.thing,
        id: child.id,
        name: child.name,
        parent: { id: parent.id, name: nameOf(parent) },
        says,
      }));
    }),
  );
}

const nameOf = ({ code }: FishRow): string => code ?? 'A fish not told apart';

type Doubted = { child: Child; parent: FishRow; side: 'sires' | 'dams'; there: Set<string> | null };

function wrongOf({ child, parent, side, there }: Doubted): [Contradiction['kind'], string][] {
  const wrong: [Contradiction['kind'], string][] = [];
  const [name, role] = [nameOf(parent), side === 'sires' ? 'sire' : 'dam'];
  if (child.until && parent.bornOn && parent.bornOn >= child.until)
    wrong.push(['younger', `${name}, ${role} of ${child.name}, was not born yet when it was spawned.`]);
  if (parent.sex === (side === 'sires' ? 'female' : 'male'))
    wrong.push(['sex', `${name} is recorded as a ${parent.sex}, and as ${role} of ${child.name}.`]);
  const left = parent.exit && child.from && parent.exit.onDay < child.from ? parent.exit : null;
  if (left?.kind === 'died') wrong.push(['dead', `${name}, ${role} of ${child.name}, had died before it was spawned.`]);
  else if (left && left.kind !== 'merged')
    wrong.push(['away', `${name}, ${role} of ${child.name}, had left before it was spawned.`]);
  else if (there && side === 'sires' && !there.has(parent.id))
    wrong.push(['away', `${name}, sire of ${child.name}, was not in the tank when it was spawned.`]);
  return wrong;
}

async function children({ db, roomId }: Scope): Promise<Child[]> {
  const holds = await db
    .selectFrom('hold')
    .leftJoin('brood', (join) => join.onRef('brood.roomId', '=', 'hold.roomId').onRef('brood.holdId', '=', 'hold.id'))
    .leftJoin('fish', (join) => join.onRef('fish.roomId', '=', 'hold.roomId').onRef('fish.id', '=', 'hold.holderId'))
    .where('hold.roomId', '=', roomId)
    .select(['hold.id', 'hold.parentageId', 'hold.spawnEarliest', 'hold.spawnLatest', 'hold.tankId'])
    .select(['brood.id as broodId', 'brood.code as broodCode', 'fish.code'])
    .execute();
  const broods = await db
    .selectFrom('brood')
    .where('roomId', '=', roomId)
    .where('holdId', 'is', null)
    .select(['id', 'code', 'parentageId', 'spawnEarliest', 'spawnLatest'])
    .execute();
  const fish = await db
    .selectFrom('fish')
    .where('roomId', '=', roomId)
    .where('parentageId', 'is not', null)
    .select(['id', 'code', 'parentageId', 'bornOn'])
    .execute();
  return [
    ...holds.map(
      (row): Child => ({
        thing: row.broodId ? 'brood' : 'hold',
        id: row.broodId ?? row.id,
        name: row.broodCode ?? (row.code ? `the hold of ${row.code}` : 'a hold'),
        rootId: row.parentageId,
        from: row.spawnEarliest,
        until: row.spawnLatest,
        tankId: row.tankId,
      }),
    ),
    ...broods.map(
      ({ id, code, parentageId, spawnEarliest, spawnLatest }): Child => ({
        ...{ thing: 'brood', id, name: code, rootId: parentageId },
        ...{ from: spawnEarliest, until: spawnLatest, tankId: null },
      }),
    ),
    ...fish.map(
      ({ id, code, parentageId, bornOn }): Child => ({
        ...{ thing: 'fish', id, name: code ?? 'a fish not told apart', rootId: parentageId ?? '' },
        // The young of a male that died while the eggs were held are his: its birthday says nothing of his leaving.
        ...{ from: null, until: bornOn, tankId: null },
      }),
    ),
  ];
}

/** No write makes one; a database that was mended by hand may hold one. */
async function loops(scope: Scope): Promise<Contradiction[]> {
  try {
    sortPedigree((await pedigreeOf(scope)).entries);
    return [];
  } catch (error) {
    if (!(error instanceof PedigreeError) || error.reason !== 'cycle') throw error;
    const names = await namesIn(scope, error.ids);
    const row = await scope.db
      .selectFrom('fish')
      .where('roomId', '=', scope.roomId)
      .where('id', 'in', error.ids)
      .select('id')
      .executeTakeFirst();
    const says = `A fish is its own ancestor: ${[...names, names[0]].join(', child of ')}.`;
    return row ? [{ kind: 'loop', thing: 'fish', id: row.id, name: names[0] ?? 'a fish', parent: null, says }] : [];
  }
}
