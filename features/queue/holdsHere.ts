import type { FishRow } from '@/shared/fish/contract';
import type { HoldRow } from '@/shared/holds/contract';
import type { TankRow } from '@/shared/tanks/contract';
import { beginningIn, spawnIn } from './settling';
import type { Waiting } from './waiting';

/** What this device has seen of the fishroom. */
export type Seen = { tanks: readonly TankRow[]; fish: readonly FishRow[] };

/** The open holds as they will be once what waits here has gone up: begun ones are there, ended ones are not. */
export function holdsAfter(holds: readonly HoldRow[], entries: readonly Waiting[], seen: Seen): HoldRow[] {
  const waiting = entries.filter(({ state, trouble }) => state !== 'takenBack' && trouble === null);
  const ended = new Set(waiting.flatMap(({ content }) => (content.kind === 'holdEnded' ? [content.holdId] : [])));
  const known = new Set(holds.map(({ id }) => id));
  const begun = waiting.flatMap((entry) => {
    const row = rowOf(entry, holds, seen);
    return row && !known.has(row.id) ? [row] : [];
  });
  return [...holds, ...begun].filter(({ id }) => !ended.has(id));
}

function rowOf({ content }: Waiting, holds: readonly HoldRow[], { tanks, fish }: Seen): HoldRow | null {
  const mine = beginningIn(content);
  const tank = tanks.find(({ id }) => id === mine?.tankId);
  if (!mine || !tank) return null;
  const holder = fish.find(({ id }) => id === mine.holderId);
  const colony = tank.residents.find(({ thing, id }) => thing === 'colony' && id === mine.colonyId);
  const strainId = holder?.strainId ?? colony?.strainId ?? null;
  // Another hold of the strain knows how long this species holds; the water is the tank's own heater until it is told.
  const like = holds.find((hold) => hold.strainId === strainId);
  const heater = tank.heaterC === null ? [] : [{ on: spawnIn(mine).spawnLatest, celsius: tank.heaterC }];
  const speciesId = like?.clock.speciesId ?? holder?.speciesId ?? null;
  return {
    id: mine.holdId,
    version: 0,
    holder: mine.holderId ? { id: mine.holderId, code: holder?.code ?? null } : null,
    colony: colony ? { id: colony.id, code: colony.code } : null,
    tank: { id: tank.id, code: tank.code },
    strainId,
    strainCode: holder?.strainCode ?? colony?.strainCode ?? null,
    displayName: holder?.displayName ?? colony?.displayName ?? null,
    locality: like?.locality ?? null,
    mode: like?.mode ?? null,
    ...spawnIn(mine),
    plan: mine.plan,
    outcome: null,
    endedOn: null,
    checkedOn: [],
    brood: null,
    femalesInColony: fish.filter((one) => one.sex === 'female' && one.colony?.id === mine.colonyId).length,
    clock: {
      speciesId,
      overrides: like?.clock.overrides ?? {},
      about: like?.clock.about ?? null,
      finished: like?.clock.finished ?? [],
      temperatures: like && like.tank.id === tank.id ? like.clock.temperatures : heater,
    },
  };
}
