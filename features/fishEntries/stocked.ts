import type { FishRow } from '@/shared/fish/contract';
import type { SpeciesProfile } from '@/shared/species/profile';
import { profilesIn } from '@/shared/species/profilesIn';
import type { TankRow } from '@/shared/tanks/contract';
import type { TankResident } from '@/shared/tanks/resident';
import { type StockingCheck, stockingCheck } from '@/shared/tanks/stockingCheck';
import type { TodayFacts } from '@/shared/today/facts';
import type { UnitChoices } from '@/shared/units';

/** Who goes in: a resident of another tank, whole or in part, or one fish. */
export type Moving = { thing: 'colony' | 'batch' | 'fish'; id: string; heads: number | null };

type Known = { fish: readonly FishRow[]; facts: TodayFacts };

/** The tank judged as it would be after the move; null while nothing is known of the species. */
export function checkAfter(
  tank: TankRow,
  moving: Moving,
  { fish, facts }: Known,
  units: UnitChoices,
): StockingCheck | null {
  const profiles = profilesIn(facts.species);
  const there = tank.residents
    .filter(({ id }) => id !== moving.id)
    .map(({ thing, id, heads }) => ({ thing, id, heads }));
  const residents = [...there, moving]
    .flatMap((one) => residentOf(one, { fish, facts }, profiles) ?? [])
    .filter(({ speciesId }) => profiles.has(speciesId));
  if (residents.length === 0) return null;
  return stockingCheck(tank, residents, [...profiles.values()], units);
}

function residentOf(
  { thing, id, heads }: Moving,
  { fish, facts }: Known,
  profiles: Map<string, SpeciesProfile>,
): TankResident | null {
  if (thing !== 'batch') {
    const own = fish.filter((one) => (thing === 'colony' ? one.colony?.id === id : one.id === id));
    const [first] = own;
    if (!first?.speciesId) return null;
    const of = (sex: FishRow['sex']) => own.filter((one) => one.sex === sex).length;
    const name = (thing === 'colony' ? first.colony?.code : first.code) ?? 'A fish';
    return {
      ...nameless,
      name,
      speciesId: first.speciesId,
      males: of('male'),
      females: of('female'),
      unsexed: of('unknown'),
    };
  }
  const batch = facts.batches.find((one) => one.id === id);
  if (!batch?.speciesId) return null;
  // Never measured: as long as they were when they were let go.
  const mm = batch.meanTenthsMm === null ? profiles.get(batch.speciesId)?.releaseMm.value : batch.meanTenthsMm / 10;
  return {
    ...nameless,
    name: batch.codes.join(' + '),
    speciesId: batch.speciesId,
    unsexed: heads ?? batch.balance,
    smallestMm: mm ?? null,
    largestMm: mm ?? null,
  };
}

const nameless = { locality: null, males: 0, females: 0, unsexed: 0, smallestMm: null, largestMm: null };
