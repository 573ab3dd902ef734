import { headCountOf } from '../../shared/broods/headCount';
import { addDays, daysBetween } from '../../shared/days';
import { Refusal } from '../../shared/refusal';
import { animalId } from '../../shared/sheets/ancestry';
import type { SheetContent } from '../../shared/sheets/content';
import { batchesOf, oneBrood } from '../broods';
import { oneFish } from '../fish';
import type { Scope } from '../scope';
import { namingOf } from './lineagePart';
import { claimOf, kindsOf } from './strainClaim';

export type Subject = { thing: 'fish' | 'brood'; id: string; heads: number };
type About = { about: Pick<SheetContent, 'subject' | 'strain' | 'birth'>; tankIds: string[]; spawn: Spawn | null };
export type Spawn = { spawnEarliest: string; spawnLatest: string };

export async function fishAbout(scope: Scope, { id }: Subject): Promise<About> {
  const naming = await namingOf(scope);
  const fish = await oneFish(scope, id);
  if (fish.origin === 'imported')
    throw new Refusal('conflict', 'This fish is known from a sheet of another fishroom, which issues its sheets');
  const brood = fish.brood ? await oneBrood(scope, fish.brood.id) : null;
  return {
    about: {
      subject: {
        id: naming.animal(id),
        kind: 'fish',
        code: fish.code ?? 'not told apart',
        heads: {
          male: fish.sex === 'male' ? 1 : 0,
          female: fish.sex === 'female' ? 1 : 0,
          unsexed: fish.sex === 'unknown' ? 1 : 0,
        },
        sexSure: fish.sex === 'unknown' || fish.sexCertain,
      },
      strain: await claimOf(scope, fish.strainId, [fish.displayName ?? '']),
      birth: {
        spawned: brood
          ? { from: brood.spawnEarliest, to: brood.spawnLatest }
          : fish.bornOn
            ? { from: fish.bornOn, to: fish.bornOn }
            : null,
        taken: brood ? takenOf(brood) : null,
        arrived: fish.arrivedOn,
        raised: null,
      },
    },
    tankIds: fish.tank ? [fish.tank.id] : [],
    spawn: brood,
  };
}

export async function broodAbout(scope: Scope, { id, heads }: Subject): Promise<About> {
  const brood = await oneBrood(scope, id);
  if (heads > Math.max(1, Math.floor(brood.heads))) {
    throw new Refusal('invalid', `Only ${Math.floor(brood.heads)} of this brood are here`, {
      heads: `At most ${Math.floor(brood.heads)}`,
    });
  }
  const batches = await batchesOf(scope, [id]);
  const alive = batches.reduce(
    (sum, { lines, sources }) =>
      sum + headCountOf(lines).balance * (sources.find(({ broodId }) => broodId === id)?.share ?? 0),
    0,
  );
  return {
    about: {
      subject: {
        id: animalId(scope.roomId, id),
        kind: 'brood',
        code: brood.code,
        heads: { male: 0, female: 0, unsexed: heads },
        sexSure: true,
      },
      strain: await claimOf(scope, brood.strainId, await kindsOf(scope, id)),
      birth: {
        spawned: { from: brood.spawnEarliest, to: brood.spawnLatest },
        taken: takenOf(brood),
        arrived: brood.start === 'acquired' ? brood.startedOn : null,
        // What left alive was raised too: of those that opened the count, all that did not die.
        raised:
          brood.opened === null
            ? null
            : { alive: Math.max(Math.round(alive), brood.opened - brood.lost), of: brood.opened },
      },
    },
    tankIds: brood.tanks.map((tank) => tank.id),
    spawn: brood,
  };
}

function takenOf(brood: { start: string; startedOn: string; spawnEarliest: string; spawnLatest: string }) {
  const how =
    brood.start === 'stripped' || brood.start === 'released'
      ? brood.start
      : brood.start === 'acquired'
        ? null
        : 'hatched';
  if (!how) return null;
  const middle = addDays(brood.spawnEarliest, Math.floor(daysBetween(brood.spawnEarliest, brood.spawnLatest) / 2));
  return {
    how,
    on: brood.startedOn,
    holdDay: how === 'hatched' ? null : daysBetween(middle, brood.startedOn) + 1,
  } as const;
}
