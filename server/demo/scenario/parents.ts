import type * as z from 'zod/mini';
import type { ParentageDraft } from '../../../shared/lineage/parentageDraft';
import { librarySpecies, profileOf } from '../../../shared/species/library';
import { type FoundStory, firstDayOf, type HoldStory, lastDayOf } from './broods';
import { type Life, livesOf, possibleSires, sexOn, tankOf, tankOfColony } from './lives';
import type { Key } from './shape';
import { HOLDS, heldBackFish, strainOfColony } from './stories';
import { STRAINS } from './strains';

type Parentage = z.input<typeof ParentageDraft>;

/** A female that died holding leaves by her hold. */
const diedHolding = (key: Key): number | null => {
  const hold = HOLDS.find(({ dam, end }) => dam === key && end?.how === 'diedHolding');
  return hold?.end && 'age' in hold.end ? lastDayOf(hold.spawn) + hold.end.age : null;
};

export const LIVES: Life[] = livesOf(heldBackFish()).map((life) => ({
  ...life,
  until: life.until ?? diedHolding(life.key),
}));

/** Adult females of a colony on a day, for a hold where nobody can tell which. */
function femalesOf(colony: string, day: number): Key[] {
  const tank = tankOfColony(colony, day);
  return LIVES.filter(
    (life) =>
      life.homes.some((home) => home.colony === colony) && tankOf(life, day) === tank && sexOn(life, day) === 'female',
  ).map(({ key }) => key);
}

/** One father for all where the species' habit says so; where it is not known, each egg counts by itself. */
function habitOf(colony: string): 'single' | 'mixed' {
  const { speciesId } = STRAINS[strainOfColony(colony)];
  return (librarySpecies(speciesId) && profileOf(speciesId).paternity.value.habit) || 'mixed';
}

/** Who may be the parents, as a keeper would leave the proposal: the male that was seen, or all of the tank by dominance. */
export function parentageOf(story: Pick<HoldStory, 'colony' | 'dam' | 'spawn' | 'seenWith'> | FoundStory): Parentage {
  const [from, until] = [firstDayOf(story.spawn), lastDayOf(story.spawn)];
  const tank = tankOfColony(story.colony, until) ?? '';
  const dams = story.dam ? [story.dam] : femalesOf(story.colony, until);
  const damSide = dams.map((fishId) => ({ fishId, weight: 1 }));
  if ('seenWith' in story && story.seenWith) {
    const sires = [{ fishId: story.seenWith, weight: 1 }];
    return { paternity: 'single', sires, dams: damSide, basis: 'Seen with her at the spawn' };
  }
  const proposed = possibleSires(LIVES, tank, from, until);
  const span = until - from + 15;
  const said = proposed
    .filter(({ days }) => days > 0)
    .map(({ fish, days }) => `${fish.code} dominant ${days} of ${span} days`);
  return {
    paternity: habitOf(story.colony),
    sires: proposed.map(({ fish, weight }) => ({ fishId: fish.key, weight })),
    dams: damSide,
    basis: said.length > 0 ? said.join(', ') : 'No male recorded dominant: equal shares',
  };
}
