import type { Day } from '../days';
import { adultMm } from '../species/adultSize';
import { librarySpecies, profileOf } from '../species/library';
import type { BroodRow } from './contract';
import { type Stage, stageOf } from './stage';

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
