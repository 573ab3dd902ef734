import { type Day, daysBetween } from '../days';

/** The six stages of life, as the mark's six bars show them. */
export const STAGES = ['egg', 'wriggler', 'fry', 'juvenile', 'subadult', 'adult'] as const;
export type Stage = (typeof STAGES)[number];

export const STAGE_NAMES: Record<Stage, string> = {
  egg: 'Egg',
  wriggler: 'Wriggler',
  fry: 'Fry',
  juvenile: 'Juvenile',
  subadult: 'Subadult',
  adult: 'Adult',
};

/** How many of the six bars are filled. */
export const barsOf = (stage: Stage): number => STAGES.indexOf(stage) + 1;

/** Share of the adult length from which a stage begins. House rule: there is no common definition. */
const FROM_SHARE = { juvenile: 0.2, subadult: 0.4, adult: 0.75 };
/** Days from the spawn where nothing was measured. House rule. */
const FROM_DAYS = { wriggler: 6, juvenile: 75, subadult: 180, adult: 400 };

export type StageFacts = {
  spawnLatest: Day;
  /** Null before the head count opens. */
  openedOn: Day | null;
  /** Last mean length and the species' adult length, both as total length in mm; null where not known. */
  meanMm: number | null;
  adultMm: number | null;
  today: Day;
};

/**
 * The stage of a brood: by its last mean length as a share of the adult length where both are known, else by days from the
 * spawn. Before the head count opens it is egg or wriggler.
 */
export function stageOf({ spawnLatest, openedOn, meanMm, adultMm, today }: StageFacts): Stage {
  const days = daysBetween(spawnLatest, today);
  if (openedOn === null) return days < FROM_DAYS.wriggler ? 'egg' : 'wriggler';
  if (meanMm !== null && adultMm !== null) {
    const share = meanMm / adultMm;
    return share >= FROM_SHARE.adult
      ? 'adult'
      : share >= FROM_SHARE.subadult
        ? 'subadult'
        : share >= FROM_SHARE.juvenile
          ? 'juvenile'
          : 'fry';
  }
  return days >= FROM_DAYS.adult
    ? 'adult'
    : days >= FROM_DAYS.subadult
      ? 'subadult'
      : days >= FROM_DAYS.juvenile
        ? 'juvenile'
        : 'fry';
}
