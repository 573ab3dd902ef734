import { byNumber } from '../codes';
import { type Day, daysBetween } from '../days';
import type { SpeciesProfile } from '../species/profile';
import type { LineageNode } from './contract';

export type Candidate = {
  id: string;
  code: string;
  sex: 'male' | 'female';
  sexCertain: boolean;
  tank: string | null;
  ageDays: number | null;
  lengthTenthsMm: number | null;
  /** Why it is left out unless the keeper takes it in: "3.1 cm, too small to breed". */
  doubt: 'tooSmall' | 'tooOld' | null;
};

/** Half of its adult length is taken where no size at first breeding is known: common practice, no source. */
const MATURE_SHARE = 0.5;
const DAYS_PER_YEAR = 365.25;

/**
 * The living breeders and holdbacks among some animals whose sex is recorded, by code. Too small is judged by the species'
 * size at first breeding, too old by the keeper's own limit in years (null: none); what is not known leaves no doubt.
 */
export function candidatesOf(
  nodes: readonly LineageNode[],
  profile: SpeciesProfile | null,
  today: Day,
  oldestYears: number | null,
): Candidate[] {
  return nodes
    .flatMap((node): Candidate[] => {
      const { id, thing, living, keptAs, sex, code, tank, bornOn, lastLengthTenthsMm, sexCertain } = node;
      if (thing !== 'fish' || !living || (keptAs !== 'breeder' && keptAs !== 'holdback')) return [];
      if (sex === 'unknown' || code === null) return [];
      const ageDays = bornOn ? daysBetween(bornOn, today) : null;
      const mature = matureMm(profile, sex);
      const tooSmall = mature !== null && lastLengthTenthsMm !== null && lastLengthTenthsMm < 10 * mature;
      const tooOld = oldestYears !== null && ageDays !== null && ageDays > oldestYears * DAYS_PER_YEAR;
      return [
        {
          id,
          code,
          sex,
          sexCertain,
          tank: tank?.code ?? null,
          ageDays,
          lengthTenthsMm: lastLengthTenthsMm,
          doubt: tooSmall ? 'tooSmall' : tooOld ? 'tooOld' : null,
        },
      ];
    })
    .sort((a, b) => byNumber(a.code, b.code));
}

function matureMm(profile: SpeciesProfile | null, sex: 'male' | 'female'): number | null {
  if (!profile) return null;
  const known = profile.maturity?.value;
  const own = sex === 'male' ? known?.maleMm : known?.femaleMm;
  const adult = sex === 'male' ? profile.adultMale?.value : profile.adultFemale?.value;
  return own ?? known?.mm ?? (adult ? adult.mm * MATURE_SHARE : null);
}

/** How many of each sex a group of the species has at least, as far as there are fish for it. */
export function usualGroup(
  profile: SpeciesProfile | null,
  there: { males: number; females: number },
): { males: number; females: number } {
  const perMale = profile?.femalesPerMale.value ?? 2;
  const group = profile?.minGroup.value ?? 3;
  const males = Math.max(1, Math.min(there.males, Math.floor(group / (1 + perMale))));
  const females = Math.max(Math.ceil(males * perMale), group - males);
  return { males, females: Math.max(1, Math.min(there.females, females)) };
}
