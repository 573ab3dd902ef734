import type { BroodRow } from '@/shared/broods/contract';
import { type Stage, stageOf } from '@/shared/broods/stage';
import type { Day } from '@/shared/days';
import { adultMm } from '@/shared/species/adultSize';
import { librarySpecies, profileOf } from '@/shared/species/library';

/** The stage of a brood today, by its last sample where the species' adult length is known. */
export function broodStage(brood: BroodRow, today: Day): Stage {
  const { speciesId, lastSample, spawnLatest, openedOn } = brood;
  const adult = speciesId && librarySpecies(speciesId) ? adultMm(profileOf(speciesId), null) : null;
  return stageOf({
    spawnLatest,
    openedOn,
    meanMm: lastSample ? lastSample.meanTenthsMm / 10 : null,
    adultMm: adult,
    today,
  });
}
